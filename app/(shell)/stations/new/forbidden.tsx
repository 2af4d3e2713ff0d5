import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoNewStation() {
  return <Forbidden verb="station.write" viewer={await currentViewer()} />;
}
