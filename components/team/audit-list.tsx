import { keepUnits } from "@/components/ui/keep-units";
import { describeAction, describeDetail, nameSubject } from "./describe-event";
import { exactTime, timeAgo } from "./time-ago";

interface AuditListProps {
  events: {
    id: string;
    at: Date;
    actor: string | null;
    action: string;
    subjectId: string;
    subjectName: string | null;
    detail: unknown;
  }[];
  now: Date;
}

/** Who did what, newest first; the exact time on hover, the details on demand. */
export function AuditList({ events, now }: AuditListProps) {
  return (
    <ol className="border border-rule bg-sheet">
      {events.map((event) => {
        const lines = describeDetail(event.detail);
        return (
          <li key={event.id} className="border-b border-rule last:border-0">
            <details className="open:bg-water-1/40">
              <summary className="flex cursor-pointer list-none flex-wrap items-baseline gap-x-6 gap-y-0.5 px-4 py-2">
                <span className="min-w-0 flex-[1_1_16rem] break-words">
                  <span className="font-medium">{event.actor ?? "Neap itself"}</span>{" "}
                  {describeAction(event.action)}{" "}
                  <span className="font-medium">{keepUnits(nameSubject(event))}</span>
                </span>
                <time
                  dateTime={event.at.toISOString()}
                  title={exactTime(event.at)}
                  className="text-sm text-ink-soft"
                >
                  {timeAgo(event.at, now)}
                </time>
                <span className="text-sm text-deep underline">Details</span>
              </summary>
              <dl className="grid gap-x-4 gap-y-1 px-4 pt-1 pb-3 text-sm sm:grid-cols-[10rem_1fr]">
                {[
                  { label: "time", text: exactTime(event.at) },
                  { label: "action", text: event.action },
                  { label: "subject", text: event.subjectId },
                  ...lines,
                ].map(({ label, text }, index) => (
                  <div key={index} className="contents">
                    <dt className="text-ink-soft">{label}</dt>
                    <dd className="break-words max-sm:mb-1">{text}</dd>
                  </div>
                ))}
              </dl>
            </details>
          </li>
        );
      })}
    </ol>
  );
}
