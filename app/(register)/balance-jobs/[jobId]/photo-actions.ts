'use server';

import { action } from '@/lib/server/action';
import { addPhoto } from '@/lib/server/commands/add-photo';

export const addPhotoAction = action(addPhoto);
