import { describe, expect, it } from 'vitest';
import { formToInput, typedValues } from '@/lib/server/form-input';

function form(fields: Readonly<Record<string, string>>): FormData {
  const data = new FormData();
  for (const [name, value] of Object.entries(fields)) data.append(name, value);
  return data;
}

describe('what a failed form hands back', () => {
  it('is everything typed, but never a password', () => {
    const typed = { name: 'Ann', 'siteIds.7': '7', password: 'three plain words', $ACTION_ID: 'x' };
    expect(typedValues(form(typed))).toEqual({ name: 'Ann', 'siteIds.7': '7' });
  });

  it('is every tick of a name, in lines', () => {
    const data = form({ reason: '' });
    data.append('planeIds', '3');
    data.append('planeIds', '5');
    expect(typedValues(data)).toEqual({ reason: '', planeIds: '3\n5' });
  });

  it('while the command is given the password, and ticks as a list', () => {
    const typed = { password: 'three plain words', 'siteIds.7': '7', 'siteIds.12': '12' };
    expect(formToInput(form(typed))).toEqual({
      password: 'three plain words',
      siteIds: ['7', '12'],
    });
  });
});
