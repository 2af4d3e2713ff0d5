/** What went wrong with a sending, as one sentence; nothing where nothing did. */
export function Trouble({ says }: { says: string | null }) {
  if (says === null) return null;
  return (
    <p role="alert" className="error-box">
      {says}
    </p>
  );
}
