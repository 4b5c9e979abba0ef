import { RECOMPUTE_MASK, recomputeMask } from "@/lib/commands/mask/recompute-mask";
import type { JobTools } from "@/lib/commands/mask/recompute-mask";

/** What a worker does for the jobs of each queue. Whatever runs here may run twice. */
export const JOB_HANDLERS: Record<string, (tools: JobTools, data: unknown) => Promise<void>> = {
  [RECOMPUTE_MASK]: recomputeMask,
};
