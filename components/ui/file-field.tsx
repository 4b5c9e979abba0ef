import { useId } from "react";
import { FieldFrame } from "./field-frame";

interface FileFieldProps {
  label: string;
  accept: string;
  /** The input empties itself afterwards, so that a mended file can be chosen again. */
  onFile: (file: File) => void;
}

/**
 * Asks for one file; its button looks like the other buttons. What became of the file is said
 * beside it: the browser's own words would go on saying that none was chosen.
 */
export function FileField({ label, accept, onFile }: FileFieldProps) {
  const id = useId();
  return (
    <FieldFrame id={id} label={label}>
      <input
        id={id}
        type="file"
        accept={accept}
        className="block max-w-full text-[0px] file:mr-3 file:min-h-10 file:cursor-pointer file:rounded-sm file:border file:border-solid file:border-ink-soft file:bg-sheet file:px-4 file:text-base file:font-medium file:text-ink hover:file:border-deep hover:file:text-deep"
        onChange={(event) => {
          const file = event.currentTarget.files?.[0];
          event.currentTarget.value = "";
          if (file) onFile(file);
        }}
      />
    </FieldFrame>
  );
}
