import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoNewSource() {
  return <Forbidden verb="source.write" viewer={await currentViewer()} />;
}
