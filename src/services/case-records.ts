/* Rows of findings and due items as the domain reads them. */
import { type DueItem, type Finding, type Rich } from '@domain/case';
import { type DueRow } from '@data/due';
import { type FindingWithPosts } from '@data/findings';

/** A finding with its thread. */
export function findingAsDomain(row: FindingWithPosts): Finding {
  return {
    id: row.id,
    case: row.caseId,
    number: row.number,
    weight: row.weight,
    place: row.place,
    state: row.state,
    raisedBy: row.raisedBy,
    ...(row.successorId ? { successor: row.successorId } : {}),
    posts: row.posts.map((post) => ({
      by: post.byId,
      at: post.at,
      text: post.text,
      ...(post.changePath !== null ? { change: post.changePath } : {}),
    })),
  };
}

/** A due item. */
export function dueAsDomain(row: DueRow): DueItem {
  return {
    id: row.id,
    kind: row.kind,
    ...(row.caseId ? { case: row.caseId } : {}),
    ...(row.documentId ? { document: row.documentId } : {}),
    ...(row.subject !== null ? { subject: row.subject } : {}),
    text: row.text,
    owner: row.ownerId,
    due: row.due,
    ...(row.dueAt ? { dueAt: row.dueAt } : {}),
    ...(row.closes !== null ? { closes: row.closes } : {}),
    ...(row.bars ? { bars: row.bars } : {}),
    state: row.state,
    ...(row.evidence ? { evidence: row.evidence } : {}),
    ...(row.interim != null ? { interim: row.interim as Rich } : {}),
    ...(row.outcome ? { outcome: row.outcome } : {}),
    asked: { by: row.askedBy, at: row.askedAt },
    ...(row.signatureId ? { signature: row.signatureId } : {}),
  };
}
