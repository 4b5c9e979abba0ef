"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorNote } from "@/components/ui/error-note";
import { Field } from "@/components/ui/field";
import { readNumber } from "@/components/ui/read-number";
import { SelectField } from "@/components/ui/select-field";
import { StatusNote } from "@/components/ui/status-note";
import { useActionForm } from "@/components/ui/use-action-form";
import { guardOf } from "@/lib/core/bench/guard";
import type { GuardRule, UncertaintyBudget } from "@/lib/core/bench/uncertainty-budget";
import { GUARD_RULES } from "@/lib/core/bench/uncertainty-budget";
import { GUARD_RULE_LABELS } from "./budget-words";

type Outcome =
  | { ok: true; data: { guardDb: number } }
  | { ok: false; message: string; fieldErrors: Record<string, string> };

interface GuardRuleFormProps {
  benchId: string;
  rule: GuardRule;
  guardDb: number;
  /** The saved budget: what is typed above counts once it is saved. */
  budget: UncertaintyBudget | null;
  save: (input: unknown) => Promise<Outcome>;
}

const OPTIONS = GUARD_RULES.map((value) => ({ value, label: GUARD_RULE_LABELS[value] }));

/** Chooses where the guard comes from and says what it would be. */
export function GuardRuleForm(props: GuardRuleFormProps) {
  const { benchId, guardDb, budget, save } = props;
  const [rule, setRule] = useState(props.rule);
  const [done, setDone] = useState<string | null>(null);
  const form = useActionForm({
    action: save,
    read: (data): unknown => {
      setDone(null);
      return {
        benchId,
        guardRule: rule,
        guardDb: rule === "stated" ? readNumber(data.get("guardDb")) : null,
      };
    },
    onDone: (data) => setDone(`The guard of new sweeps is ${data.guardDb} dB.`),
  });
  const computed = rule === "stated" ? null : guardOf(rule, budget, 0);
  return (
    <form onSubmit={form.onSubmit} method="post" className="max-w-3xl">
      <ErrorNote message={form.message} />
      <StatusNote message={done} />
      <div className="grid gap-x-5 sm:grid-cols-2">
        <SelectField
          label="Guard rule"
          name="guardRule"
          options={OPTIONS}
          value={rule}
          onChange={(event) =>
            setRule(GUARD_RULES.find((known) => known === event.target.value) ?? "stated")
          }
          error={form.fieldErrors.guardRule}
        />
        {rule === "stated" ? (
          <Field
            label="Guard in dB"
            name="guardDb"
            inputMode="decimal"
            defaultValue={guardDb}
            hint="Margins smaller than this are shown as inside guard."
            error={form.fieldErrors.guardDb}
          />
        ) : (
          <p className="self-center" role="status">
            {computed === null ? (
              "The saved budget does not give this guard yet."
            ) : (
              <>
                The saved budget gives a guard of{" "}
                <span className="font-mono whitespace-nowrap">{computed} dB</span>
                {rule === "excess" && computed === 0 ? ": U lies within U_CISPR." : "."}
              </>
            )}
          </p>
        )}
      </div>
      <Button type="submit" look="quiet" disabled={form.pending}>
        Set guard rule
      </Button>
    </form>
  );
}
