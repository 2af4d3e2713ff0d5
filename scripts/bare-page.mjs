import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { nextBin, root } from './settings.mjs';
import { execute } from './steps.mjs';

const folder = path.join(root, '.data/bare');
const files = {
  'app/layout.js': `export default function Layout({ children }) { return <html lang="en"><body>{children}</body></html>; }`,
  'app/page.js': `export default function Page() { return <p>bare</p>; }`,
  'next.config.mjs': `export default { agentRules: false, turbopack: { root: ${JSON.stringify(root)} } };`,
};

/** Gzipped bytes of the JavaScript that an app of one empty page loads: the framework by itself, really built. */
export async function bareBytes() {
  const { version } = JSON.parse(readFileSync(path.join(root, 'node_modules/next/package.json'), 'utf8'));
  const stamp = path.join(folder, 'built-by');
  if (!existsSync(stamp) || readFileSync(stamp, 'utf8') !== version) await build(stamp, version);
  const html = readFileSync(path.join(folder, '.next/server/app/index.html'), 'utf8');
  return scriptsOf(html).reduce((sum, script) => sum + gzipped(path.join(folder, '.next', script)), 0);
}

/** The scripts that a page's HTML asks a present-day browser for, as paths below `_next/`. */
export function scriptsOf(html) {
  const tags = html.match(/<script[^>]*\ssrc=[^>]*>/g) ?? [];
  const modern = tags.filter((tag) => !/\snomodule/i.test(tag));
  return [...new Set(modern.map((tag) => tag.match(/_next\/(static\/[^"?]+)/)?.[1]).filter(Boolean))];
}

export const gzipped = (file) => gzipSync(readFileSync(file)).length;

async function build(stamp, version) {
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(path.join(folder, 'app'), { recursive: true });
  for (const [name, text] of Object.entries(files)) writeFileSync(path.join(folder, name), text);
  const { code, output } = await execute([nextBin, 'build', folder], {
    quiet: true,
    env: { NODE_ENV: 'production' },
  });
  if (code !== 0) throw new Error(`the bare page did not build\n${output}`);
  writeFileSync(stamp, version);
}
