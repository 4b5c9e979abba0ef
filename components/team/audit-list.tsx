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
          <li key={event.id} className="border-b border-rule px-4 py-3 last:border-0">
            <div className="flex flex-wrap gap-x-6 gap-y-1">
              <span className="min-w-0 flex-1 break-words">
                <span className="font-medium">{event.actor ?? "Neap itself"}</span>{" "}
                {describeAction(event.action)}{" "}
                <span className="font-medium">{nameSubject(event)}</span>
              </span>
              <time
                dateTime={event.at.toISOString()}
                title={exactTime(event.at)}
                className="text-sm text-ink-soft"
              >
                {timeAgo(event.at, now)}
              </time>
            </div>
            <details className="mt-1 text-sm">
              <summary className="w-fit cursor-pointer text-deep">Details</summary>
              <dl className="mt-2 grid gap-x-4 gap-y-1 sm:grid-cols-[10rem_1fr]">
                {[
                  { label: "time", text: exactTime(event.at) },
                  { label: "action", text: event.action },
                  { label: "subject", text: event.subjectId },
                  ...lines,
                ].map(({ label, text }, index) => (
                  <div key={index} className="contents">
                    <dt className="text-ink-soft">{label}</dt>
                    <dd className="break-words">{text}</dd>
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
