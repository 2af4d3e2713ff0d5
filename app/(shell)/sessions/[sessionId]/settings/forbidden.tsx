import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoSettings() {
  return <Forbidden verb="session.edit" viewer={await currentViewer()} />;
}
