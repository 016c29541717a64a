import type { Actor } from '@/lib/auth/actor';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { ownerSql } from './database';
import { makeAttempt } from './factories';
import { markPieces } from './mark-pieces';
import { makeStarter, publishAndOffer, valueFrom } from './practicals';
import type { Misses } from './readings';
import { makeActor, makePerson, makeSchool, makeSection, type TestSchool } from './school';

export interface SharedSchool {
  school: TestSchool;
  rut: Actor;
  dayo: Actor;
  head: Actor;
}

/** A department of two teachers and their head. */
export async function makeSharedSchool(): Promise<SharedSchool> {
  const school = await makeSchool();
  return {
    school,
    rut: await makeActor(school, 'teacher', { givenName: 'Rut', familyName: 'Lindqvist' }),
    dayo: await makeActor(school, 'teacher', { givenName: 'Dayo', familyName: 'Okonjo' }),
    head: await makeActor(school, 'head', { givenName: 'Imre', familyName: 'Vass' }),
  };
}

/** A practical on offer in version 1, and a colleague's copy of it. */
export async function offerAndAdopt(owner: Actor, copier: Actor, starter: StarterId = 'desk-caddy') {
  const practicalId = await makeStarter(owner, starter);
  const { versionId } = await publishAndOffer(owner, practicalId);
  const copy = valueFrom(await copyPractical(copier, { practicalId, versionId }));
  return { practicalId, versionId, copyId: copy.practicalId };
}

/** A section whose students have been read to the end under a version: one attempt for each of the misses. */
export async function recordSection(
  school: TestSchool,
  teacher: Actor,
  versionId: string,
  misses: readonly Misses[],
  period = '3',
): Promise<{ sittingId: string; attemptIds: string[] }> {
  const sql = ownerSql();
  const studentIds: string[] = [];
  for (const _ of misses) studentIds.push((await makePerson(school, ['student'])).personId);
  const sectionId = await makeSection(school, { teacherIds: [teacher.personId], studentIds });
  await sql`update sections set period = ${period} where id = ${sectionId}`;
  const [version] = await sql<{ practical_id: string; rubric: Parameters<typeof markPieces>[3] }[]>`
    select practical_id, rubric from rubric_versions where id = ${versionId}`;
  if (!version) throw new Error('There is no such version.');
  const [sitting] = await sql<{ id: string }[]>`insert into sittings ${sql({
    school_id: school.id,
    section_id: sectionId,
    practical_id: version.practical_id,
    rubric_version_id: versionId,
    opened_by: teacher.personId,
  })} returning id`;
  const sittingId = sitting?.id ?? '';
  const attemptIds: string[] = [];
  for (const [index, miss] of misses.entries()) {
    const attemptId = await makeAttempt(school, sittingId, studentIds[index] ?? '');
    await markPieces(teacher, sittingId, attemptId, version.rubric, miss);
    attemptIds.push(attemptId);
  }
  return { sittingId, attemptIds };
}
