import { sql } from "drizzle-orm";
import { readings } from "@/db/schema";

/**
 * Only readings against the revision of their mask that is in force and that the program names,
 * with levels restated to the mask's distance when the program asks for it and as taken when not.
 */
export const isNewestRevision = () => sql`${readings.maskRevisionId} = (
  select r.id from mask_revisions r
  where r.team_id = ${readings.teamId} and r.mask_id = ${readings.maskId}
    and r.in_force_at is not null
  order by r.revision desc limit 1)
  and exists (
    select 1 from program_masks pm
    join builds b on b.team_id = pm.team_id and b.program_id = pm.program_id
    join sweeps s on s.team_id = b.team_id and s.build_id = b.id
    where pm.team_id = ${readings.teamId} and pm.mask_id = ${readings.maskId}
      and pm.restate_distance = ${readings.restated}
      and s.id = ${readings.sweepId})`;
