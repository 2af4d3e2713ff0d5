import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoRight() {
  return <Forbidden verb="session.read" viewer={await currentViewer()} />;
}
