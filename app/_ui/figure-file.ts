/** A drawing of the page as a file that stands alone: its colours are those on the screen. */
export function svgText(figure: SVGSVGElement): string {
  const copy = figure.cloneNode(true) as SVGSVGElement;
  const { width, height } = figure.viewBox.baseVal;
  copy.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  copy.setAttribute('width', String(width));
  copy.setAttribute('height', String(height));
  copy.setAttribute('font-family', 'sans-serif');
  for (const name of ['class', 'aria-hidden', 'data-figure']) copy.removeAttribute(name);
  const colours = getComputedStyle(document.documentElement);
  const ground = `<rect width="${width}" height="${height}" fill="var(--sheet)"/>`;
  const text = new XMLSerializer().serializeToString(copy).replace(/^(<svg[^>]*>)/, `$1${ground}`);
  return text.replaceAll(/var\((--[a-z0-9-]+)\)/g, (_, name: string) =>
    colours.getPropertyValue(name).trim(),
  );
}
