import { z } from 'zod';

/** What the find box shows: machines whose tag, name or alias holds the text, best first. */
export const foundMachines = z.object({
  machines: z.array(
    z.object({ id: z.number(), tag: z.string(), name: z.string(), siteName: z.string() }),
  ),
});

export type FoundMachines = z.output<typeof foundMachines>;
