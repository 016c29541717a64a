import 'server-only';
import { z } from 'zod';
import { selectSchool } from '@/db/queries/school';
import { defineVerb } from '../verb';

/** The unit that the school measures in, which a new practical begins with. */
export const readSchoolUnit = defineVerb({
  action: 'practical.create',
  input: z.strictObject({}),
  async run({ actor, tx, found, authorize }): Promise<'in' | 'mm'> {
    authorize({ schoolId: actor.schoolId });
    return found(await selectSchool(tx, actor.schoolId)).unit;
  },
});
