'use client';

import { useState } from 'react';
import { Segmented } from '@/components/ui/segmented';
import { SignInStaff } from './sign-in-staff';
import { SignInStudent } from './sign-in-student';

const WHO = [
  { value: 'staff', label: 'staff' },
  { value: 'student', label: 'student' },
];

interface SignInProps {
  who: 'staff' | 'student';
  schoolCode: string;
}

/** Both forms stay where they are while one chooses, so that nothing typed is lost. */
export function SignIn({ who, schoolCode }: SignInProps) {
  const [chosen, setChosen] = useState<string>(who);
  return (
    <div className="grid gap-4">
      <Segmented
        label="who signs in"
        className="[&_label]:flex-1"
        options={WHO}
        value={chosen}
        onChange={setChosen}
      />
      <div hidden={chosen !== 'staff'}>
        <SignInStaff />
      </div>
      <div hidden={chosen !== 'student'}>
        <SignInStudent schoolCode={schoolCode} />
      </div>
    </div>
  );
}
