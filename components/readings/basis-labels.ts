import type { Basis } from "@/lib/core/reading/reading";

export const BASIS_LABELS: Record<Basis, string> = {
  "like-for-like": "like for like",
  "upper-bound": "upper bound",
  "cannot-decide": "cannot decide",
};
