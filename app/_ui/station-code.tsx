/** A station's code in its box; who takes part, not what it answered. */
export function StationCode({ code, name }: { code: string; name?: string }) {
  return (
    <span className="stn" title={name}>
      {code}
    </span>
  );
}
