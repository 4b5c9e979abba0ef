"use client";

import { factorSpan } from "@/components/benches/factor-span";
import { ConfirmButton } from "@/components/ui/confirm-button";
import type { FactorPoint } from "@/lib/core/bench/signal-path";
import { dueState } from "@/lib/core/bench/due-state";
import { DueMark } from "./due-mark";

export interface HistoryRow {
  id: string;
  calibratedOn: string;
  dueOn: string | null;
  laboratory: string;
  certificateNumber: string;
  fileName: string | null;
  factors: FactorPoint[] | null;
  recordedBy: string;
  recordedAt: Date;
  withdrawnAt: Date | null;
}

interface CalibrationHistoryProps {
  equipmentId: string;
  /** Newest first. */
  calibrations: HistoryRow[];
  /** ISO date. */
  today: string;
  /** Null: this member may not, or the equipment is archived. */
  withdraw: ((input: unknown) => Promise<{ ok: true } | { ok: false; message: string }>) | null;
}

/** Every calibration; the newest that was not withdrawn is in force. */
export function CalibrationHistory(props: CalibrationHistoryProps) {
  const { equipmentId, calibrations, today, withdraw } = props;
  const inForce = calibrations.find((c) => c.withdrawnAt === null);
  return (
    <ol className="border border-rule bg-sheet">
      {calibrations.map((c) => (
        <li
          key={c.id}
          className="flex flex-wrap items-start gap-x-6 gap-y-2 border-b border-rule px-3 py-3 last:border-0"
        >
          <div className="min-w-44">
            <p className={`font-mono ${c.withdrawnAt ? "line-through" : ""}`}>{c.calibratedOn}</p>
            <p className="text-sm text-ink-soft">
              {c.withdrawnAt
                ? `withdrawn ${c.withdrawnAt.toISOString().slice(0, 10)}`
                : c === inForce
                  ? "in force"
                  : "earlier"}
            </p>
          </div>
          <div className="min-w-44">
            {c.dueOn ? (
              <p>
                due <span className="font-mono">{c.dueOn}</span>
              </p>
            ) : (
              <p className="text-ink-soft">no due date stated</p>
            )}
            {c === inForce && c.dueOn ? <DueMark state={dueState(c.dueOn, today)} /> : null}
          </div>
          <div className="min-w-0 flex-[1_1_16rem]">
            <p className="break-words">
              {c.laboratory || <span className="text-ink-soft">laboratory not stated</span>}
              {c.certificateNumber ? (
                <span className="ml-2 inline-block font-mono text-sm">{c.certificateNumber}</span>
              ) : null}
            </p>
            <p className="text-sm break-words">
              {c.fileName ? (
                <a
                  href={`/benches/equipment/${equipmentId}/certificates/${c.id}`}
                  className="text-deep underline"
                  download
                >
                  {c.fileName}
                </a>
              ) : (
                <span className="text-ink-soft">no certificate uploaded</span>
              )}
              {c.factors ? (
                <span className="ml-3 text-ink-soft">
                  {c.factors.length} factors, {factorSpan(c.factors)}
                </span>
              ) : null}
            </p>
            <p className="text-sm text-ink-soft">
              recorded by {c.recordedBy},{" "}
              <time dateTime={c.recordedAt.toISOString()}>
                {c.recordedAt.toISOString().slice(0, 10)}
              </time>
            </p>
          </div>
          {withdraw && c.withdrawnAt === null ? (
            <ConfirmButton
              label="Withdraw"
              title={`Withdraw the calibration of ${c.calibratedOn}?`}
              confirmLabel="Withdraw calibration"
              action={() => withdraw({ equipmentId, calibrationId: c.id })}
            >
              <p>
                For one that was entered by mistake. It no longer counts and cannot be put in force
                again, but stays in this history with its certificate. Signal paths that took its
                factors keep them until they are revised.
              </p>
            </ConfirmButton>
          ) : null}
        </li>
      ))}
    </ol>
  );
}
