import { Forbidden } from '@/app/_ui/forbidden';
import { networkOf } from '@/src/data/station/read';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoSettings() {
  const viewer = await currentViewer();
  return <Forbidden verb="session.edit" viewer={viewer} stations={await networkOf(viewer)} />;
}
