/** The usual cautions; the people at the site decide. */
export function Cautions() {
  return (
    <section aria-labelledby="cautions-title" className="desk-card">
      <h2 id="cautions-title">Before it moves</h2>
      <ul className="help list-disc pl-[16px]">
        <li>This page plans; it moves no antenna. Interlocks, stow limits and the person on duty decide.</li>
        <li>People are clear of the antenna before it moves.</li>
        <li>Keeping away from the Sun is the station’s rule; what is said here is advice.</li>
        <li>Masers and high voltage only by those licensed at the site. Local codes come first.</li>
      </ul>
    </section>
  );
}
