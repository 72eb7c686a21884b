import type { LogbookView } from '#shared/schemas/logbook'
import { timeText } from '~/utils/time-text'

const deeds: Record<string, string> = {
  submit: 'submitted it', abort: 'aborted it', revise: 'asked for a revision', accept: 'accepted it', return: 'returned it', review: 'reviewed it',
  finish: 'stored the result', complete: 'completed it', queue: 'queued it', hold: 'held it', amend: 'amended the spectrum', upload: 'uploaded the spectrum', create: 'created it',
  'invite': 'invited somebody', 'invite-again': 'sent an invitation again', 'withdraw-invitation': 'withdrew an invitation', 'join': 'joined', 'leave': 'left',
  'change-role': 'changed a role', 'remove-member': 'removed a member', 'appoint-lead': 'appointed a lead', 'retry': 'had it fitted again',
}

/** One line of the logbook in words; a note in it is shown. */
export function logbookWords({ id, at, actor, action, detail }: LogbookView) {
  const said = ['note', 'verdict', 'reason'].flatMap(key => (typeof detail[key] === 'string' && detail[key] ? [String(detail[key])] : []))
  const deed = deeds[action] ?? action.replaceAll('-', ' ').replaceAll('_', ' ')
  return { id, when: timeText(at), who: actor ?? 'Trotline', deed: said.length ? `${deed}: ${said.join(', ')}` : deed }
}
