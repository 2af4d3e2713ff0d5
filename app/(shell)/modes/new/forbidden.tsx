import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoNewMode() {
  return <Forbidden verb="mode.write" viewer={await currentViewer()} />;
}
