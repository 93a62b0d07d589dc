import type { Db } from '@/lib/database';

/** One line of who did what to what. `detail` holds ids and figures, never names or prose. */
export type AuditLine = {
  action: string;
  subject: { kind: 'entry' | 'person' | 'orchard' | 'tree' | 'species'; id: string };
  detail?: Record<string, string | number | boolean | null | string[]>;
};

/** Appends to the log. Call it in the transaction of the change it speaks of. */
export async function writeAudit(
  db: Db,
  actorId: string | null,
  requestId: string,
  line: AuditLine,
): Promise<void> {
  await db('audit_log').insert({
    actor_id: actorId,
    request_id: requestId.slice(0, 64),
    action: line.action,
    subject_kind: line.subject.kind,
    subject_id: line.subject.id,
    detail: line.detail ? JSON.stringify(line.detail) : null,
  });
}
