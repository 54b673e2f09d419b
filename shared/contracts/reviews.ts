import * as z from 'zod';
import { checklistAnswers, checklistPoints, decisionReasons, decisions } from '../domain/review.ts';
import { states } from '../domain/states.ts';
import { endpoint } from './endpoint.ts';
import { check, entry } from './entries.ts';

/** Who holds a submission, and until when. */
export const claim = z.object({ by: z.string(), mine: z.boolean(), until: z.string() });

export const queueItem = z.object({
  submission: z.string(), accession: z.string(), round: z.int(), state: z.enum(states),
  equation: z.string(), surface: z.string(), asPrinted: z.string(), unitAsPrinted: z.string(), sourceLabel: z.string(),
  contributor: z.string(), submittedAt: z.string(),
  checks: z.array(check), claim: claim.nullable(),
  /** Submitted by the viewer, who therefore may not decide. */
  own: z.boolean(),
});
export type QueueItem = z.infer<typeof queueItem>;

export const listReviews = endpoint({
  method: 'GET', path: '/reviews', access: 'reviewer', summary: 'The review queue, oldest first',
  query: z.object({
    state: z.enum(['waiting', 'submitted', 'under-review', 'mine', 'decided']).default('waiting'),
    limit: z.coerce.number().int().min(1).max(200).default(50), cursor: z.string().max(500).optional(),
  }),
  response: z.object({
    items: z.array(queueItem), total: z.int(), totalIsExact: z.boolean(), nextCursor: z.string().nullable(),
    counts: z.object({ waiting: z.int(), submitted: z.int(), underReview: z.int(), mine: z.int(), decided: z.int() }),
  }),
});

export const checklist = z.partialRecord(z.enum(checklistPoints), z.enum(checklistAnswers));
export type Checklist = z.infer<typeof checklist>;

export const reviewView = z.object({
  submission: z.string(), round: z.int(), state: z.enum(states), contributor: z.string(), submittedAt: z.string(), own: z.boolean(),
  entry,
  claim: claim.nullable(),
  checklist,
  /** Tag of what the reviewer saw, sent back with the decision. */
  seen: z.string(),
  /** What differs from the version before, as printed. */
  changes: z.array(z.object({ field: z.string(), before: z.string(), after: z.string() })),
  neighbours: z.array(z.object({ accession: z.string(), label: z.string(), energyKJPerMol: z.number(), computed: z.boolean(), sameSurface: z.boolean() })),
  comments: z.array(z.object({ id: z.string(), by: z.string(), at: z.string(), body: z.string() })),
  decision: z.object({ decision: z.enum(decisions), reason: z.string().nullable(), comment: z.string(), by: z.string(), at: z.string() }).nullable(),
  earlier: z.array(z.object({ round: z.int(), decision: z.string(), comment: z.string(), by: z.string(), at: z.string() })),
  /** What the viewer may do, and why not when not. */
  actions: z.array(z.enum(['claim', 'release', 'comment', 'checklist', 'decide'])),
  whyNot: z.string().nullable(),
  next: z.string().nullable(),
});
export type ReviewView = z.infer<typeof reviewView>;

const submissionParam = z.object({ submission: z.uuid() });

export const getReview = endpoint({ method: 'GET', path: '/reviews/:submission', access: 'reviewer', summary: 'One submission with all a reviewer needs', params: submissionParam, response: reviewView });
export const claimReview = endpoint({ method: 'POST', path: '/reviews/:submission/claim', access: 'reviewer', summary: 'Take a submission, or renew the claim', params: submissionParam, response: reviewView });
export const releaseReview = endpoint({ method: 'POST', path: '/reviews/:submission/release', access: 'reviewer', summary: 'Give a claimed submission back to the queue', params: submissionParam, response: reviewView });
export const saveChecklist = endpoint({ method: 'PATCH', path: '/reviews/:submission/checklist', access: 'reviewer', summary: 'Save the checklist so far; renews the claim', params: submissionParam, body: z.object({ checklist }), response: reviewView });
export const commentReview = endpoint({
  method: 'POST', path: '/reviews/:submission/comments', access: 'contributor', summary: 'Say something about a submission: its contributor or a reviewer', params: submissionParam,
  body: z.object({ body: z.string().trim().min(1).max(4000) }), response: z.object({ id: z.string() }),
});
export const decisionBody = z.object({
  decision: z.enum(decisions),
  reason: z.enum(decisionReasons).optional(),
  comment: z.string().trim().max(4000).default(''),
  checklist: checklist.default({}),
  seen: z.string().max(100),
});
export const decideReview = endpoint({
  method: 'POST', path: '/reviews/:submission/decision', access: 'reviewer', summary: 'Accept, return or reject; takes effect at once', params: submissionParam,
  body: decisionBody, response: reviewView,
});
