import Link from "next/link";
import { keepUnits } from "@/components/ui/keep-units";
import type { Confirmation } from "./mask-words";
import { confirmationWords } from "./mask-words";

interface ListedRevision {
  revision: number;
  createdAt: Date;
  title: string;
  source: "shipped" | "team" | "confirmation";
  confirmation: Confirmation | null;
  inForceAt: Date | null;
}

interface MaskRevisionListProps {
  /** Newest first. */
  revisions: ListedRevision[];
  /** The one in force. */
  current: number;
  shown: number;
  href: (revision: number) => string;
}

const SOURCE_WORDS = { shipped: "shipped with Neap", team: "saved by the team" } as const;

function wordsOf({ source, confirmation }: ListedRevision): string {
  if (confirmation) return confirmationWords(confirmation);
  return source === "confirmation" ? "confirmed" : SOURCE_WORDS[source];
}

/** Every revision with the exact time it was saved, where it came from, and which one counts. */
export function MaskRevisionList({ revisions, current, shown, href }: MaskRevisionListProps) {
  return (
    <ol className="border border-rule bg-sheet" reversed>
      {revisions.map((row) => {
        const { revision, createdAt, title, inForceAt } = row;
        const marks = [
          ...(inForceAt === null ? ["being put in force"] : []),
          ...(revision === current ? ["in force"] : []),
          ...(revision === shown ? ["shown above"] : []),
        ];
        return (
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
            <span className="min-w-0 break-words text-ink-soft">
              {keepUnits(title)}; {wordsOf(row)}
            </span>
            <span className="ml-auto text-sm text-ink-soft">{marks.join(", ")}</span>
          </li>
        );
      })}
    </ol>
  );
}
