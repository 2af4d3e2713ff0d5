import type { ReactNode } from 'react';
import { StaveCodes } from '@/app/_ui/stave-codes';
import { staveOrder } from '@/app/_ui/stave-order';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { Toaster } from '@/app/_ui/toaster';
import { listStations } from '@/src/data/station/read';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function ShellLayout({ children }: { children: ReactNode }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const network = await listStations(viewer, 'in use');
  const codes = network.ok ? staveOrder(network.stations).map(({ code }) => code) : [];
  return (
    <StaveCodes codes={codes}>
      {children}
      <Toaster />
    </StaveCodes>
  );
}
