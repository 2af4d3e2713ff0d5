import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoNewSession() {
  return <Forbidden verb="session.make" viewer={await currentViewer()} />;
}
