'use server';

import { action } from '@/lib/server/action';
import { keepHeld, lineThrough, rehome } from '@/lib/server/commands/settle-record';

export const keepHeldAction = action(keepHeld);
export const rehomeAction = action(rehome);
export const lineThroughAction = action(lineThrough);
