/** What has become of a suspect that is followed over builds. */
export const SUSPECT_STATES = ["open", "explained", "treated", "accepted"] as const;
export type SuspectState = (typeof SUSPECT_STATES)[number];
