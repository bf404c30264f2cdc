import { Faker, en } from '@faker-js/faker';

/** The invented serial number stamped on a machine's rotor: the same for a tag in every seeding. */
export function demoSerial(tag: string): string {
  const faker = new Faker({ locale: en, seed: parseInt(Buffer.from(tag).toString('hex'), 16) });
  return `${faker.string.alpha({ length: 2, casing: 'upper' })} ${faker.string.numeric(5)}`;
}
