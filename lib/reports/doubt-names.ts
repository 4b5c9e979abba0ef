import type { DoubtCode } from "@/lib/core/reading/reading";

/** Short names of the doubts, the same as on screen. */
export const DOUBT_NAMES: Record<DoubtCode, string> = {
  "rbw-differs": "RBW differs",
  "rbw-unstated": "RBW not stated",
  "rbw-kind-differs": "RBW counted otherwise",
  "step-coarse": "Step too coarse",
  "not-covered": "Not covered",
  "polarization-missing": "Polarization missing",
  "calibration-overdue": "Calibration overdue",
  "calibration-unchecked": "Calibration not known",
  "ambient-not-taken": "Ambient not taken",
  "ambient-near": "Ambient near",
  "ambient-not-comparable": "Ambient not comparable",
  "sweep-time-short": "Sweep too fast",
  "sweep-time-unchecked": "Sweep time not known",
  "distance-restated": "Distance restated",
  "near-field": "Near field",
  "overload-suspected": "Overload suspected",
  "overload-unchecked": "Overload not checked",
  "bench-check-drifted": "Bench drifted",
  "mask-from-memory": "Mask from memory",
  "plane-wave-assumed": "Plane wave assumed",
};
