/** The ruled list before its rows; the words come only when it takes long. */
export function Waiting() {
  return (
    <div className="flex flex-1 flex-col">
      <div className="list-head">
        <h1>Sessions</h1>
      </div>
      <div className="list-sheet flex-1">
        <div className="ruled-rows" aria-hidden="true" />
        <p className="late-words" role="status">
          <b>Reading the sessions</b>
        </p>
      </div>
    </div>
  );
}
