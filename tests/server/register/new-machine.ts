import type { z } from 'zod';
import type { createMachineInput } from '@/lib/schemas/register-input';
import type { SmallPlant } from '@/tests/support/plant';

type Input = z.input<typeof createMachineInput>;

/** An axial fan with seven positions, as its form would send it. */
export function newMachine(plant: SmallPlant, over: Partial<Input> = {}): Input {
  return {
    siteId: plant.home.siteId,
    tag: 'AX-1',
    name: 'Aisle fan',
    kind: 'axial fan',
    area: 'Mill hall',
    powerKw: '90',
    speedMinRpm: '960',
    speedMaxRpm: '1000',
    nominalSpeedRpm: '980',
    drive: 'direct',
    lineHz: '50',
    criticality: 'C',
    support: 'rigid',
    mark: 'Punch mark',
    tachoDeg: '0',
    tachoEdge: 'rising',
    rotationFromDriveEnd: 'clockwise',
    limitSetId: plant.limitSetId,
    rotorSerial: `${over.tag ?? 'AX-1'}-R`,
    rotorMassKg: '260',
    balanceGrade: '2,5',
    bearingSpanM: '1.2',
    centreOfMassFromAM: '0.6',
    overhung: undefined,
    bearings: ['A', 'B'].map((label) => ({
      label,
      fromAM: label === 'A' ? '0' : '1.2',
      horizontal: 'on' as const,
      vertical: 'on' as const,
      axial: undefined,
    })),
    planes: [
      {
        name: 'B',
        radiusMm: '310',
        fromAM: '',
        maxGTotal: '',
        pieceG: '5',
        positions: '7',
        numbering: 'against',
        firstDeg: '0',
        positionMaxG: '60',
      },
    ],
    ...over,
  };
}
