import { Forbidden } from '@/app/_ui/forbidden';
import { networkOf } from '@/src/data/station/read';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoSky() {
  const viewer = await currentViewer();
  return <Forbidden verb="plan.read-draft" viewer={viewer} stations={await networkOf(viewer)} />;
}
