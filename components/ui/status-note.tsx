/** A word after something was done, announced politely. */
export function StatusNote({ message }: { message: string | null }) {
  return (
    <div role="status">
      {message ? (
        <p className="mb-4 border border-l-4 border-rule border-l-deep bg-sheet px-3 py-2">
          {message}
        </p>
      ) : null}
    </div>
  );
}
