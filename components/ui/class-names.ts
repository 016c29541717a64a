import { type ClassValue, clsx } from 'clsx';
import { extendTailwindMerge } from 'tailwind-merge';

const merge = extendTailwindMerge({
  extend: {
    classGroups: {
      'font-size': [
        {
          text: [
            'small',
            'label',
            'text',
            'lead',
            'heading',
            'verdict',
            'key',
            'deviation',
            'title',
            'graduation',
            'score',
            'target',
          ],
        },
      ],
      'border-w': [{ border: ['outline', 'edge', 'cursor'] }],
      'border-w-t': [{ 'border-t': ['outline', 'edge', 'cursor'] }],
      'border-w-b': [{ 'border-b': ['outline', 'edge', 'cursor'] }],
      'border-w-l': [{ 'border-l': ['outline', 'edge', 'cursor'] }],
      'border-w-r': [{ 'border-r': ['outline', 'edge', 'cursor'] }],
    },
    theme: { spacing: ['touch', 'bench', 'desk', 'inset'] },
  },
});

/** Joins class names; of two that set the same property the later one stays. */
export function classNames(...values: ClassValue[]): string {
  return merge(clsx(values));
}
