import { ThemeSwitch } from "./theme-switch";

/** The caution that every reading, page and report carries, and the choice of day or night. */
export function Deferral() {
  return (
    <footer className="mt-12 flex flex-wrap items-start justify-between gap-x-8 gap-y-3 border-t border-rule pt-3 text-sm text-ink-soft">
      <p className="max-w-[75ch] flex-1 basis-64">
        Bench pre-compliance data. Only an accredited test lab and the applicable edition of the
        standard decide.
      </p>
      <ThemeSwitch />
    </footer>
  );
}
