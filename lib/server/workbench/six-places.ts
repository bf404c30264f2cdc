import 'server-only';
import { sixPlaceCheck } from '@/lib/domain/balancing/six-place-check';
import { ok } from '@/lib/domain/result';
import { rotorDeg } from '@/lib/domain/units';
import type { SolvedSixPlaces } from '@/lib/schemas/workbench-weights';
import { sixPlacesInput } from '@/lib/schemas/workbench-weights-input';
import { computation } from '../computation';
import { typedAngles } from './typed-angles';

/** Residual unbalance from the sizes with a known weight at six places or more, evenly spaced. */
export const sixPlaces = computation(
  { permission: 'workbench:use', input: sixPlacesInput },
  (given) => {
    const { angleSense, amplitudes, massG, radiusMm } = given;
    const first = typedAngles([{ deg: given.firstDeg, field: 'firstDeg' }], angleSense);
    if (!first.ok) return first;
    const knownGmm = massG * radiusMm;
    const checked = sixPlaceCheck({ amplitudes, knownGmm });
    if (!checked.ok) return checked;
    // Places counted with rotation run the other way round from the first.
    const turn = angleSense === 'with' ? -checked.value.angleDeg : checked.value.angleDeg;
    const angleDeg = rotorDeg((first.value[0] ?? 0) + turn);
    return ok<SolvedSixPlaces>({ ...checked.value, angleDeg, knownGmm, angleSense });
  },
);
