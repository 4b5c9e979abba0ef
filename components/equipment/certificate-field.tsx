"use client";

import { Button } from "@/components/ui/button";
import { FileField } from "@/components/ui/file-field";

interface CertificateFieldProps {
  file: File | null;
  error: string | undefined;
  onFile: (file: File | null) => void;
}

/** The certificate to upload; it is kept beside the form, so that a refusal does not lose it. */
export function CertificateField({ file, error, onFile }: CertificateFieldProps) {
  return (
    <div className="mb-4">
      <FileField
        label="Certificate"
        accept=".pdf,.png,.jpg,.jpeg,application/pdf,image/*"
        onFile={onFile}
      />
      <p role="status" className="-mt-2 text-sm break-words">
        {file
          ? `${file.name} will be stored with the calibration.`
          : "No file chosen; PDF or a picture, up to 20 MB."}
      </p>
      {error ? (
        <p role="alert" className="mt-1 text-sm text-aground">
          {error}
        </p>
      ) : null}
      {file ? (
        <Button look="quiet" className="mt-2" onClick={() => onFile(null)}>
          Leave it out
        </Button>
      ) : null}
    </div>
  );
}
