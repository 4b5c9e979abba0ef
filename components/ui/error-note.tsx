/** What went wrong, in the server's own words, above the form it concerns. */
export function ErrorNote({ message }: { message: string | null }) {
  return (
    <div role="alert" className="empty:contents">
      {message ? (
        <p className="mb-4 border border-l-4 border-rule border-l-aground bg-sheet px-3 py-2">
          {message}
        </p>
      ) : null}
    </div>
  );
}
