import type { FieldMetadata } from '@conform-to/react';
import type { z } from 'zod';
import type { setUpSchoolInput } from '@/lib/contracts/school';

type Typed = z.input<typeof setUpSchoolInput>;

/** The form's fields, as its parts share them. */
export type SetUpFields = Required<{ [Name in keyof Typed]: FieldMetadata<Typed[Name], Typed, string[]> }>;
