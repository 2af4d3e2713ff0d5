import { Forbidden } from '@/app/_ui/forbidden';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function NoCatalogue() {
  return <Forbidden verb="catalogue.read" viewer={await currentViewer()} />;
}
