import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoMailbox() {
  return <Forbidden verb="mail.read" viewer={await currentViewer()} />;
}
