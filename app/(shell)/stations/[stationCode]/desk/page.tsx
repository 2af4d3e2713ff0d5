import type { Metadata } from 'next';
import { forbidden, notFound } from 'next/navigation';
import { ToSignIn } from '@/app/_ui/to-sign-in';
import { readDesk } from '@/src/data/desk/read';
import { currentViewer } from '@/src/viewer/current-viewer';
import { currentTheme } from '@/src/viewer/theme';
import { PageFrame } from '../../../_masthead/page-frame';
import { Desk } from './_desk/desk';
import './_desk/desk.css';

export const metadata: Metadata = { title: 'Desk' };

export default async function DeskPage({ params }: { params: Promise<{ stationCode: string }> }) {
  const viewer = await currentViewer();
  if (!viewer) return <ToSignIn />;
  const answer = await readDesk(viewer, (await params).stationCode);
  if (!answer.ok) {
    if (answer.code === 'forbidden') forbidden();
    notFound();
  }
  const { desk } = answer;
  const { code, name } = desk.station;
  const given = desk.run ? ` · ${desk.run.code} ${desk.run.title}` : '';
  // a desk is dark by itself; who chose a theme keeps it
  const theme = (await currentTheme()) === null ? 'night' : undefined;
  return (
    <div data-theme={theme} className="bg-paper text-ink">
      <PageFrame
        viewer={viewer}
        nowMs={desk.nowMs}
        place={{ kind: 'station', stationCode: code }}
        title={name}
        sub={`${code} · station desk${given}`}
      >
        <Desk desk={desk} />
      </PageFrame>
    </div>
  );
}
