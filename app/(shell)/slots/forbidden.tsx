import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoSlots() {
  return <Forbidden verb="slot.reply" viewer={await currentViewer()} />;
}
