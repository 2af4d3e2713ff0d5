import type { ReactNode } from 'react';
import { KeepFocus } from '@/app/_ui/keep-focus';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { Toaster } from '@/app/_ui/toaster';
import { currentViewer } from '@/src/viewer/current-viewer';

export default async function ShellLayout({ children }: { children: ReactNode }) {
  if (!(await currentViewer())) return <ToSignIn />;
  return (
    <>
      {children}
      <Toaster />
      <KeepFocus />
    </>
  );
}
