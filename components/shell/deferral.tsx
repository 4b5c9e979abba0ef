/** The caution that every reading, page and report carries. */
export function Deferral() {
  return (
    <footer className="mt-12 border-t border-rule pt-3 text-sm text-ink-soft">
      Bench pre-compliance data. Only an accredited test lab and the applicable edition of the
      standard decide.
    </footer>
  );
}
