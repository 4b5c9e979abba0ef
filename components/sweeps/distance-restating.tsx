import { ActionButton } from "@/components/ui/action-button";
import { ConfirmButton } from "@/components/ui/confirm-button";
import { restatementDb, RESTATEMENT_EDGE_HZ } from "@/lib/core/reading/restate-distance";
import { formatMargin } from "@/lib/core/units/format";

interface DistanceRestatingProps {
  sweptM: number;
  maskM: number;
  programName: string;
  maskTitle: string;
  isRestated: boolean;
  action: (restate: boolean) => Promise<{ ok: true } | { ok: false; message: string }>;
}

/** Asks for sweeps to be restated to the mask's distance, with what that adds, or takes it back. */
export function DistanceRestating(props: DistanceRestatingProps) {
  const { sweptM, maskM, programName, maskTitle, isRestated, action } = props;
  if (isRestated)
    return (
      <ActionButton action={action.bind(null, false)}>Hold as taken, do not restate</ActionButton>
    );
  const above = restatementDb(sweptM, maskM, RESTATEMENT_EDGE_HZ);
  return (
    <ConfirmButton
      label={`Restate to ${maskM} m`}
      title={`Restate ${programName}'s sweeps to ${maskM} m?`}
      confirmLabel="Restate"
      action={action.bind(null, true)}
    >
      Every sweep of {programName} that was taken at another distance is then held against{" "}
      {maskTitle} with its levels restated: {formatMargin(above)} from {sweptM} m to {maskM} m at
      and above 30 MHz, twice that below. The field near a product need not follow that, so every
      such reading carries a doubt. It can be taken back at any time.
    </ConfirmButton>
  );
}
