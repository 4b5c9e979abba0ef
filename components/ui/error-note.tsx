/** What went wrong, in the server's own words, above the form it concerns. */
export function ErrorNote({ message }: { message: string | null }) {
  return (
    <div role="alert">
      {message ? (
        <p className="mb-4 border-l-4 border-aground bg-sheet px-3 py-2">{message}</p>
      ) : null}
    </div>
  );
}
