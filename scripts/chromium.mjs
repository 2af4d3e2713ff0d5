import { existsSync } from 'node:fs';

const places = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

/** The browser of the tests: CHROMIUM if it is set, else the system's. */
export function findChromium() {
  return [process.env.CHROMIUM, ...places].find((place) => place && existsSync(place));
}
