"use client";

import Link from "next/link";
import { useRouter } from "next/navigation";
import { Button, ButtonLink } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { readNumber } from "@/components/ui/read-number";
import { SelectField } from "@/components/ui/select-field";
import { TextArea } from "@/components/ui/text-area";
import { useActionForm } from "@/components/ui/use-action-form";
import type { GuardRule } from "@/lib/core/bench/uncertainty-budget";

type Outcome =
  | { ok: true; data: { benchId: string } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface BenchFormProps {
  action: (input: unknown) => Promise<Outcome>;
  /** Instruments of the team's equipment to choose from. */
  instruments: readonly { id: string; name: string; inventoryNumber: string }[];
  /** The bench that is edited; without it a new one is made. */
  bench?: {
    id: string;
    name: string;
    site: string;
    instrument: string;
    instrumentId: string | null;
    distanceM: number | null;
    guardDb: number;
    guardRule: GuardRule;
    checkToleranceDb: number;
    notes: string;
  };
}

/** Drift that a new bench allows in a check; common practice, no source. */
const COMMON_TOLERANCE_DB = 2;

export function BenchForm({ action, instruments, bench }: BenchFormProps) {
  const router = useRouter();
  // A guard that follows from the budget is not typed here.
  const isStated = !bench || bench.guardRule === "stated";
  const form = useActionForm({
    action,
    read: (data): unknown => ({
      ...(bench ? { benchId: bench.id } : { impedanceOhm: readNumber(data.get("impedanceOhm")) }),
      name: data.get("name"),
      site: data.get("site"),
      instrument: data.get("instrument"),
      distanceM:
        String(data.get("distanceM") ?? "").trim() === ""
          ? null
          : readNumber(data.get("distanceM")),
      ...(isStated ? { guardDb: readNumber(data.get("guardDb")) } : {}),
      instrumentId: data.get("instrumentId") || null,
      checkToleranceDb: readNumber(data.get("checkToleranceDb")),
      notes: data.get("notes"),
    }),
    onDone: ({ benchId }) =>
      router.push(bench ? `/benches/${benchId}` : `/benches/${benchId}/signal-path`),
  });
  const { fieldErrors } = form;
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-3xl">
      <ErrorNote message={form.message} />
      <div className="grid gap-x-5 sm:grid-cols-2">
        <Field label="Name" name="name" defaultValue={bench?.name} error={fieldErrors.name} />
        <Field
          label="Site"
          name="site"
          hint="Where it stands: a room, a chamber, a table."
          defaultValue={bench?.site}
          error={fieldErrors.site}
        />
        <SelectField
          label="Instrument, from your equipment"
          name="instrumentId"
          options={[
            { value: "", label: "none named" },
            ...instruments.map(({ id, name, inventoryNumber }) => ({
              value: id,
              label: inventoryNumber ? `${name} (${inventoryNumber})` : name,
            })),
          ]}
          hint="Its calibration then stands with every sweep."
          defaultValue={bench?.instrumentId ?? ""}
          error={fieldErrors.instrumentId}
        />
        <Field
          label="Instrument in words"
          name="instrument"
          hint="What kind it is, and its range."
          defaultValue={bench?.instrument}
          error={fieldErrors.instrument}
        />
        <Field
          label="Measuring distance in m"
          name="distanceM"
          inputMode="decimal"
          hint="Leave it empty where there is none, as on a mains bench."
          defaultValue={bench?.distanceM ?? ""}
          error={fieldErrors.distanceM}
        />
        {isStated ? (
          <Field
            label="Guard in dB"
            name="guardDb"
            inputMode="decimal"
            hint="Margins smaller than this are shown as inside guard. Write 0 for none."
            defaultValue={bench?.guardDb}
            error={fieldErrors.guardDb}
          />
        ) : (
          <div className="mb-4">
            <p className="mb-1 font-medium">Guard</p>
            <p>
              <span className="font-mono">{bench.guardDb} dB</span>, by the rule that is set{" "}
              <Link href={`/benches/${bench.id}/budget`} className="text-deep underline">
                with the uncertainty budget
              </Link>
              .
            </p>
          </div>
        )}
        <Field
          label="Drift allowed in a bench check, in dB"
          name="checkToleranceDb"
          inputMode="decimal"
          hint="A check that drifts further puts its day in doubt. 2 dB is common practice, without a source."
          defaultValue={bench?.checkToleranceDb ?? COMMON_TOLERANCE_DB}
          error={fieldErrors.checkToleranceDb}
        />
        {bench ? null : (
          <Field
            label="Impedance of the instrument's input in Ω"
            name="impedanceOhm"
            inputMode="decimal"
            hint="50 on most analyzers, 75 on some for cable networks. Levels in dBm are turned into dBµV with it."
            defaultValue={50}
            error={fieldErrors.impedanceOhm}
          />
        )}
      </div>
      <TextArea label="Notes" name="notes" defaultValue={bench?.notes} error={fieldErrors.notes} />
      <div className="flex gap-2">
        <Button type="submit" disabled={form.pending}>
          {bench ? "Save bench" : "Create bench"}
        </Button>
        <ButtonLink href={bench ? `/benches/${bench.id}` : "/benches"}>Cancel</ButtonLink>
      </div>
    </form>
  );
}
