import { routes } from '../routes';
import type { RecordFileCheckDto } from '../schemas/record-check';
import { postForJson } from './fetch-json';

/** Sends a kept job record to be checked; nothing of it is stored. */
export function checkRecordFile(text: string): Promise<RecordFileCheckDto> {
  return postForJson<RecordFileCheckDto>(routes.api.recordCheck(), text);
}
