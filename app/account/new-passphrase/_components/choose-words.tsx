'use client';

import { getFormProps, useForm } from '@conform-to/react';
import { useActionState, useState, useTransition } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { PasswordField } from '@/components/account/password-field';
import { Button } from '@/components/ui/button';
import { keepTyped } from '@/components/ui/keep-typed';
import { Segmented } from '@/components/ui/segmented';
import { SubmitButton } from '@/components/ui/submit-button';
import { choosePassphraseAction, offerWordsAction } from '../../actions';

const WAYS = [
  { value: 'made', label: 'four words' },
  { value: 'own', label: 'my own' },
];

export function ChooseWords({ offered }: { offered: string }) {
  const [lastResult, action] = useActionState(choosePassphraseAction, undefined);
  const [form, fields] = useForm<{ password: string }>({ id: 'choose-words', lastResult });
  const [way, setWay] = useState('made');
  const [words, setWords] = useState(offered);
  const [own, setOwn] = useState('');
  const [pending, startTransition] = useTransition();
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid gap-4">
      <FormRefusal errors={form.errors} />
      <Segmented label="which words" options={WAYS} value={way} onChange={setWay} />
      {way === 'made' ? (
        <>
          <input type="hidden" name="password" value={words} />
          <ol
            aria-label="your new words"
            aria-live="polite"
            className="grid gap-1 border-y-outline border-ink bg-plate px-4 py-3 text-key"
          >
            {words.split(' ').map((word) => (
              <li key={word}>{word}</li>
            ))}
          </ol>
          {fields.password.errors ? <FormRefusal errors={fields.password.errors} /> : null}
          <p className="text-label text-ink-2">Write them down before you go on: they are not shown again.</p>
          <div>
            <Button
              size="small"
              disabled={pending}
              onClick={() => startTransition(async () => setWords(await offerWordsAction()))}
            >
              other words
            </Button>
          </div>
        </>
      ) : (
        <PasswordField
          label="your own words"
          name="password"
          id={fields.password.id}
          autoComplete="new-password"
          value={own}
          onValue={setOwn}
          hint="15 characters or more, spaces count. Nothing with your name in it."
          error={fields.password.errors}
        />
      )}
      <SubmitButton pendingLabel="keeping them">keep them and go in</SubmitButton>
    </form>
  );
}
