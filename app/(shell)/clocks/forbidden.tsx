import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoClocks() {
  return <Forbidden verb="clock.read" viewer={await currentViewer()} />;
}
