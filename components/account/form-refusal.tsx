import { Refusal } from '@/components/ui/refusal';

/** What is wrong with a form as a whole, above its fields. */
export function FormRefusal({ errors }: { errors: string[] | undefined }) {
  const [first, ...more] = errors ?? [];
  if (!first) return null;
  return (
    <Refusal title={first}>{more.length > 0 ? more.map((text) => <p key={text}>{text}</p>) : null}</Refusal>
  );
}
