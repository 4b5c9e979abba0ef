/** Says that a list of spots was cut, and what is quicker then. */
export function RemeasureOmitted({ count }: { count: number }) {
  if (count === 0) return null;
  return (
    <p className="mb-3 border-l-4 border-shoal bg-shoal-bed px-3 py-2">
      {count.toLocaleString("en")} more points lie over the mask and are not listed: a scan with the
      line&rsquo;s own detector is quicker than spots here.
    </p>
  );
}
