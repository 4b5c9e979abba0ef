import Link from "next/link";
import { keepUnits } from "@/components/ui/keep-units";

interface RevisionListProps {
  /** Newest first. */
  revisions: { revision: number; createdAt: Date; summary: string }[];
  shown: number;
  href: (revision: number) => string;
}

/** Every revision with the exact time it was saved; the one that is shown is marked. */
export function RevisionList({ revisions, shown, href }: RevisionListProps) {
  return (
    <ol className="border border-rule bg-sheet" reversed>
      {revisions.map(({ revision, createdAt, summary }, i) => (
        <li
          key={revision}
          className="flex flex-wrap gap-x-6 border-b border-rule px-3 py-2 last:border-0"
        >
          <Link
            href={href(revision)}
            aria-current={revision === shown ? "page" : undefined}
            className={`text-deep underline ${revision === shown ? "font-semibold" : ""}`}
          >
            Revision {revision}
          </Link>
          <time dateTime={createdAt.toISOString()} className="font-mono">
            {createdAt.toISOString().slice(0, 16).replace("T", " ")} UTC
          </time>
          <span className="text-ink-soft">{keepUnits(summary)}</span>
          <span className="ml-auto text-sm text-ink-soft">
            {[...(i === 0 ? ["current"] : []), ...(revision === shown ? ["shown above"] : [])].join(
              ", ",
            )}
          </span>
        </li>
      ))}
    </ol>
  );
}
