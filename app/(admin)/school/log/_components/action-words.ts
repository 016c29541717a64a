import { sentenceOf } from './detail-words';

/** What the log's entries are called on screen; an action without words of its own is shown by its name. */
const WORDS: Record<string, string> = {
  'account.sign-in': 'signed in',
  'account.invitation': 'accepted the invitation',
  'account.ask-reset': 'asked for a new password',
  'account.reset': 'set a forgotten password anew',
  'account.change-password': 'changed their own password',
  'passphrase.reset': 'gave out a passphrase',
  'school.set-up': 'made the school',
  'school.change': 'changed the school or a department',
  'person.list': 'looked at people',
  'person.invite': 'invited',
  'person.change': 'changed roles or access',
  'term.add': 'added a term',
  'term.change': 'changed a term',
  'log.read': 'read the access log',
  'section.create': 'made a section',
  'section.change': 'changed a section',
  'section.read': 'looked at a section',
  'roster.read': 'looked at a roster',
  'roster.change': 'changed a roster',
  'practical.create': 'made a practical',
  'practical.change': 'changed a practical',
  'practical.read': 'looked at a practical',
  'practical.copy': 'copied a practical',
  'version.read': 'took a practical out as a file',
  'sitting.open': 'opened a sitting',
  'sitting.change': 'changed a sitting',
  'sitting.move': 'moved a sitting to another version',
  'sitting.publish': 'published',
  'sitting.read': 'looked at a sitting',
  'accommodation.list': 'looked at modified rubrics',
  'accommodation.change': 'changed modified rubrics',
  'accommodation.reason': 'read the reason of a modified rubric',
  'round.read': 'opened a round',
  'round.record': 'recorded at the bench',
  'round.finish': 'finished at the bench',
  'round.settle': 'settled two readings',
  'gradebook.read': 'looked at a gradebook',
  'grades.export': 'exported grades',
  'own.record': 'recorded own readings',
  'own.read': 'looked at own readings',
  'task.read': 'looked at own tasks',
  'result.read': 'looked at own result',
  'rubric.compare': 'compared rubrics',
  'rubric.approve': 'approved a rubric, or ended that',
};

export function sayAction(action: string): string {
  return WORDS[action] ?? action.replaceAll(/[.-]/g, ' ');
}

/** The details of an entry as one line: what it was about, and a sentence or else `roles: teacher, head; again: yes`. */
export function sayDetails(details: unknown, subjectName: string | null = null): string {
  const named: Record<string, unknown> = typeof details === 'object' ? { ...details } : {};
  const sentence = sentenceOf(named);
  if (sentence !== null && subjectName !== null) {
    return sentence.includes(subjectName) ? sentence : `${subjectName}: ${sentence}`;
  }
  return [subjectName, sentence ?? nameByName(named)].filter(Boolean).join('; ');
}

function nameByName(details: Record<string, unknown>): string {
  return Object.entries(details)
    .filter(([, value]) => value !== '' && value !== null && !isId(value))
    .map(([name, value]) => `${name.replaceAll(/([A-Z])/g, ' $1').toLowerCase()}: ${sayValue(value)}`)
    .join('; ');
}

/** Ids mean nothing to a reader; a list of them is told by how many there are. */
function isId(value: unknown): boolean {
  return typeof value === 'string' && /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/.test(value);
}

function sayValue(value: unknown): string {
  if (value === true) return 'yes';
  if (value === false) return 'no';
  if (value === null || value === '') return 'none';
  if (Array.isArray(value)) return value.some(isId) ? String(value.length) : value.map(sayValue).join(', ');
  if (typeof value === 'object') {
    return Object.entries(value)
      .filter(([, inner]) => !isId(inner))
      .map(([name, inner]) => `${name} ${sayValue(inner)}`)
      .join(', ');
  }
  return String(value);
}
