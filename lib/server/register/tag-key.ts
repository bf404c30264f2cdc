import 'server-only';

/** A tag without case and spaces: what makes two tags the same. */
export function tagKeyOf(tag: string): string {
  return tag.toLowerCase().replace(/\s+/g, '');
}
