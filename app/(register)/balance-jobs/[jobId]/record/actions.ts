'use server';

import { action } from '@/lib/server/action';
import { addAddendum } from '@/lib/server/commands/add-addendum';
import { cosignRecord } from '@/lib/server/commands/cosign-record';

export const addAddendumAction = action(addAddendum);
export const cosignRecordAction = action(cosignRecord);
