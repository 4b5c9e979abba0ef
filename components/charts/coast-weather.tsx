import type { ChartPlane } from "./chart-plane";
import type { CoastState } from "./coast-trace";

type Nothing = "no trace" | "no levels" | "none in view";

const EMPTY: Record<Nothing, [string, string]> = {
  "no trace": ["No trace chosen", "Choose a trace to draw it."],
  "no levels": ["No levels", "The trace has no sample with a level."],
  "none in view": ["No levels in view", "The trace has a gap here. Press 0 to see all of it."],
};

/** Swell of a sea without a trace: three rows of waves, still. */
function wavePath(plane: ChartPlane): string {
  const rows = [0.74, 0.83, 0.92];
  return rows
    .map((share, row) => {
      const y = plane.top + (plane.bottom - plane.top) * share;
      const waves = Math.max(1, Math.floor((plane.right - plane.left - 60) / 44));
      return `M${plane.left + 20 + row * 11},${y}${"q11,-7 22,0t22,0".repeat(waves)}`;
    })
    .join("");
}

/** What stands in the plot when there is no trace to look at: loading, an error, or nothing yet. */
export function CoastWeather(props: {
  state: CoastState;
  nothing: Nothing | null;
  plane: ChartPlane;
}) {
  const { state, nothing, plane } = props;
  if (state === "ready" && !nothing) return null;
  if (state === "loading" && !nothing)
    return (
      <p
        role="status"
        className="pointer-events-none absolute border border-rule bg-sheet px-2 text-[0.8rem] text-ink-soft"
        style={{ top: plane.top + 6, left: plane.left + 6 }}
      >
        Reading more of the trace
      </p>
    );
  const [title, text] =
    state === "loading"
      ? ["Reading the trace", "Its levels are on their way."]
      : state === "error"
        ? ["The trace could not be read", "Reload the page; what was measured is still stored."]
        : EMPTY[nothing ?? "no levels"];
  return (
    <div
      role={state === "error" ? "alert" : "status"}
      className="pointer-events-none absolute inset-0"
    >
      {nothing ? (
        <svg aria-hidden="true" className="absolute inset-0 h-full w-full">
          <path d={wavePath(plane)} fill="none" stroke="var(--water-3)" strokeWidth="1" />
        </svg>
      ) : null}
      <div className="absolute inset-x-0 top-1/4 flex justify-center px-12">
        <div
          className={`border bg-sheet px-4 py-2 text-center ${state === "error" ? "border-l-4 border-rule border-l-aground" : "border-rule"}`}
        >
          <p className="font-title text-lg">{title}</p>
          <p className="text-sm text-ink-soft">{text}</p>
        </div>
      </div>
    </div>
  );
}
