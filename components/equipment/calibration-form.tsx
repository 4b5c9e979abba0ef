"use client";

import { useState } from "react";
import { FactorTableField } from "@/components/benches/factor-table-field";
import { emptyTransducer, tableInput } from "@/components/benches/transducer-draft";
import type { ReadTable } from "@/components/benches/use-transducer-drafts";
import { useTransducerDrafts } from "@/components/benches/use-transducer-drafts";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { StatusNote } from "@/components/ui/status-note";
import { useActionForm } from "@/components/ui/use-action-form";
import { CertificateField } from "./certificate-field";

type Outcome =
  | { ok: true; data: { calibrationId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface CalibrationFormProps {
  equipmentId: string;
  /** A transducer's certificate states factors; an instrument's does not. */
  hasFactors: boolean;
  record: (form: FormData) => Promise<Outcome>;
  readTable: ReadTable;
  onDone: () => void;
}

const FIRST = [emptyTransducer(0)];

/** Records one calibration; everything typed and the file chosen stay when it is refused. */
function CalibrationFields(props: CalibrationFormProps) {
  const { equipmentId, hasFactors, record, readTable, onDone } = props;
  const [certificate, setCertificate] = useState<File | null>(null);
  const { drafts, changeTable } = useTransducerDrafts(FIRST, readTable);
  const draft = drafts[0] ?? emptyTransducer(0);
  const form = useActionForm({
    action: record,
    read: (data) => {
      const said = {
        equipmentId,
        calibratedOn: data.get("calibratedOn"),
        dueOn: data.get("dueOn") || null,
        laboratory: data.get("laboratory"),
        certificateNumber: data.get("certificateNumber"),
        table: hasFactors && draft.text.trim() !== "" ? tableInput(draft) : null,
      };
      const sent = new FormData();
      sent.set("said", JSON.stringify(said));
      if (certificate) sent.set("certificate", certificate);
      return sent;
    },
    onDone,
  });
  const { fieldErrors } = form;
  const certificateError = Object.entries(fieldErrors).find(([at]) =>
    at.startsWith("certificate."),
  );
  const tableError = Object.entries(fieldErrors).find(([at]) => at.startsWith("table"));
  return (
    <form onSubmit={form.onSubmit} method="post" className="border border-rule bg-sheet p-4">
      <ErrorNote message={form.message} />
      <div className={`grid gap-x-6 ${hasFactors ? "md:grid-cols-2" : "max-w-3xl"}`}>
        <div>
          <div className="grid gap-x-4 sm:grid-cols-2">
            <Field
              label="Calibrated on"
              name="calibratedOn"
              type="date"
              error={fieldErrors.calibratedOn}
            />
            <Field
              label="Due on"
              name="dueOn"
              type="date"
              hint="Leave it empty when the certificate and your plan state none."
              error={fieldErrors.dueOn}
            />
            <Field label="Laboratory" name="laboratory" error={fieldErrors.laboratory} />
            <Field
              label="Certificate number"
              name="certificateNumber"
              error={fieldErrors.certificateNumber}
            />
          </div>
          <CertificateField
            file={certificate}
            error={certificateError?.[1]}
            onFile={setCertificate}
          />
        </div>
        {hasFactors ? (
          <FactorTableField
            draft={draft}
            name="table"
            error={tableError?.[1]}
            onChange={(change) => changeTable(draft, change)}
          />
        ) : null}
      </div>
      <Button type="submit" disabled={form.pending}>
        Record calibration
      </Button>
    </form>
  );
}

/** The form, empty again after each calibration that was recorded. */
export function CalibrationForm(props: Omit<CalibrationFormProps, "onDone">) {
  const [recorded, setRecorded] = useState(0);
  return (
    <>
      <StatusNote message={recorded > 0 ? "The calibration is recorded." : null} />
      <CalibrationFields key={recorded} {...props} onDone={() => setRecorded((n) => n + 1)} />
    </>
  );
}
