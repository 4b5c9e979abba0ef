"use client";

import { Field } from "@/components/ui/field";
import { SelectField } from "@/components/ui/select-field";
import type { TagField } from "./tag-fields";
import type { TagDraft, TagErrors } from "./tags";

interface TagInputsProps {
  fields: readonly TagField[];
  draft: TagDraft;
  errors: TagErrors;
  onChange: (path: string, text: string) => void;
  /** What counts where this draft is empty; otherwise empty means not stated. */
  inherited?: TagDraft;
}

const FLAGS = [
  { value: "true", label: "on" },
  { value: "false", label: "off" },
];

/** One input per tag. An empty one says what that means: not stated, or as for all files. */
export function TagInputs({ fields, draft, errors, onChange, inherited }: TagInputsProps) {
  return (
    <div className="grid grid-cols-[repeat(auto-fill,minmax(13rem,1fr))] gap-x-5">
      {fields
        .filter(({ path }) => !path.startsWith("spread.") || draft.spreadOff === "false")
        .map(({ path, label, kind, hint, options }) => {
          const shared = inherited?.[path];
          const choices = options ?? (kind === "flag" ? FLAGS : null);
          const own = { label, hint, error: errors[path], value: draft[path] ?? "" };
          if (choices) {
            const labelOf = (value: string) =>
              choices.find((choice) => choice.value === value)?.label ?? value;
            const empty = shared ? `${labelOf(shared)} (as for all files)` : "not stated";
            return (
              <SelectField
                key={path}
                {...own}
                options={[{ value: "", label: empty }, ...choices]}
                onChange={(event) => onChange(path, event.target.value)}
              />
            );
          }
          return (
            <Field
              key={path}
              {...own}
              placeholder={shared ? `${shared} (as for all files)` : "not stated"}
              className={kind === "text" ? "" : "font-mono"}
              onChange={(event) => onChange(path, event.target.value)}
            />
          );
        })}
    </div>
  );
}
