import { exactTime, timeAgo } from "@/components/team/time-ago";
import { keepUnits } from "@/components/ui/keep-units";
import type { NoteChange } from "./note-words";
import { describeNoteChange } from "./note-words";

interface NoteFeedProps {
  /** The oldest first. */
  notes: { id: string; author: string; text: string; change: NoteChange | null; at: Date }[];
  now: Date;
}

/** What was said about a suspect and what changed, in order. */
export function NoteFeed({ notes, now }: NoteFeedProps) {
  return (
    <ol className="max-w-3xl border border-rule bg-sheet">
      {notes.map((note) => (
        <li key={note.id} className="border-b border-rule px-4 py-2.5 last:border-0">
          <div className="flex flex-wrap items-baseline gap-x-6 gap-y-0.5">
            <span className="min-w-0 flex-[1_1_16rem] break-words">
              <span className="font-medium">{note.author}</span>{" "}
              <span className="text-ink-soft">
                {keepUnits(describeNoteChange(note.change).join("; "))}
              </span>
            </span>
            <time
              dateTime={note.at.toISOString()}
              title={exactTime(note.at)}
              className="text-sm text-ink-soft"
            >
              {timeAgo(note.at, now)}
            </time>
          </div>
          {note.text ? <p className="mt-1 break-words whitespace-pre-line">{note.text}</p> : null}
        </li>
      ))}
    </ol>
  );
}
