/** What a thing of a kind is called, and what was done with it, in the past tense: "Ada archived the station Hollow Ridge". */
export const kindNouns: Record<string, string> = {
  campaign: 'campaign', station: 'station', instrument: 'instrument', recipe: 'recipe', spectrum: 'spectrum', retrieval: 'retrieval',
}

export const deedWords: Record<string, string> = {
  create: 'created', change: 'changed', archive: 'archived', unarchive: 'brought back', upload: 'uploaded', amend: 'amended', complete: 'completed',
  submit: 'submitted', abort: 'aborted', revise: 'asked for a revision of', review: 'reviewed', finish: 'stored the result of', queue: 'queued', hold: 'held', retry: 'sent again', replace: 'replaced', delete: 'deleted',
}

export const wordsOf = (code: string): string => code.replace(/([a-z])([A-Z])/g, '$1 $2').replaceAll(/[-_.]/g, ' ').toLowerCase()

/** "the station", "the recipe"; a kind of which nothing is known keeps its own word. */
export const nounOf = (kind: string): string => kindNouns[kind] ?? wordsOf(kind)

type Detail = Record<string, unknown>
const said = (detail: Detail, key: string) => String(detail[key] ?? 'somebody')

/** Deeds among people, which are told as a whole: their object is the campaign, and the entry names the person. */
export const peopleDeeds: Record<string, (detail: Detail) => string> = {
  'invite': detail => `invited ${said(detail, 'email')}${detail.role ? ` as ${String(detail.role)}` : ''}`,
  'invite-again': detail => `sent the invitation to ${said(detail, 'email')} again`,
  'withdraw-invitation': detail => `withdrew the invitation of ${said(detail, 'email')}`,
  'join': detail => `joined${detail.role ? ` as ${String(detail.role)}` : ''}`,
  'leave': () => 'left the campaign',
  'change-role': detail => `changed the role of ${said(detail, 'member')} from ${said(detail, 'from')} to ${said(detail, 'to')}`,
  'remove-member': detail => `removed ${said(detail, 'member')}${detail.role ? `, who was ${String(detail.role)}` : ''}`,
  'appoint-lead': detail => `made ${said(detail, 'member')} lead in the place of ${said(detail, 'instead')}`,
}
