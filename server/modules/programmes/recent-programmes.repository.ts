import type { Work } from '../../http/context';
import { recentProgrammes } from '../../db/tables/programmes';

/** Remembers that this person opened the programme just now. */
export async function rememberOpening(work: Work, programmeId: string): Promise<void> {
  await work.tx
    .insert(recentProgrammes)
    .values({ userId: work.userId, programmeId, at: work.now })
    .onConflictDoUpdate({
      target: [recentProgrammes.organisationId, recentProgrammes.userId, recentProgrammes.programmeId],
      set: { at: work.now },
    });
}
