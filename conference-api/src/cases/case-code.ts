import type { EntityManager } from 'typeorm';

/**
 * The next code of a conference, for example HIP-0042. The update locks the conference's row until the transaction
 * ends, so that no number is given twice. Plain SQL: an update through the entity would raise its version, and the
 * chair who is editing the settings would be told of a change that is none.
 */
export async function nextCaseCode(manager: EntityManager, conferenceId: string): Promise<string> {
  await manager.query('UPDATE conferences SET lastCaseNumber = lastCaseNumber + 1 WHERE id = ?', [conferenceId]);
  const rows: { code: string; lastCaseNumber: number }[] = await manager.query('SELECT code, lastCaseNumber FROM conferences WHERE id = ?', [conferenceId]);
  const { code, lastCaseNumber } = rows[0]!;
  return `${code}-${String(lastCaseNumber).padStart(4, '0')}`;
}
