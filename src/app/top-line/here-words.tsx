import { useHere } from '#src/lib/events/use-where.ts';
import { firstName } from '#src/lib/say/last-name.ts';
import { sayList } from '#src/lib/say/say-list.ts';

/** "here: Kasimir, in Comparison" */
export function HereWords() {
  const people = useHere();
  const [first, ...rest] = people;
  if (!first) return 'only you are here';
  if (rest.length === 0) return `here: ${firstName(first.name)}, in ${first.where}`;
  if (people.length <= 3) return `here: ${sayList(people.map(({ name }) => firstName(name)))}`;
  return `here: ${firstName(first.name)} and ${rest.length} others`;
}
