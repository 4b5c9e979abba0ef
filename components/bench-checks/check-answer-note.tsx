import type { CheckAnswer } from "./check-answer";

/** The answer in one large number and words, with what speaks against it. */
export function CheckAnswerNote({ answer }: { answer: CheckAnswer }) {
  const { number, words, rest, isDoubt } = answer;
  return (
    <div className="mb-6">
      <p>
        {number ? (
          <>
            <span className="mr-1.5 font-mono text-4xl [word-spacing:-0.3em] whitespace-nowrap">
              {number}
            </span>{" "}
          </>
        ) : null}
        <span className="text-lg">{words}</span>
      </p>
      {rest.length > 0 ? (
        <p className={`mt-1 ${isDoubt ? "text-shoal" : "text-ink-soft"}`}>{rest.join(" ")}</p>
      ) : null}
    </div>
  );
}
