import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoDesk() {
  return <Forbidden verb="desk.read" viewer={await currentViewer()} />;
}
