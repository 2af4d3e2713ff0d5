import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoCoverage() {
  return <Forbidden verb="plan.read-draft" viewer={await currentViewer()} />;
}
