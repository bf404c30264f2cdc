import type { FixingKind } from './photo-input';

type PhotoDto = {
  id: number;
  sha256: string;
  widthPx: number;
  heightPx: number;
  person: string;
  at: string;
};

/**
 * How a weight was fixed, and its photos. Left out where nothing was asked about it: in the plant book, and in
 * records signed before.
 */
export type FitEvidence = {
  fixedBy?: { kind: FixingKind; secured: boolean | null; noPhotoReason: string | null } | null;
  photos?: PhotoDto[];
};
