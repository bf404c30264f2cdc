import { Addendum } from './addendum';
import { Answer, Coefficient } from './answer';
import { AuditEvent } from './audit-event';
import { BalanceJob, JobPlane, JobPoint, Run, RunVector } from './balance-job';
import { Bearing, Point } from './bearing';
import { CautionShown, SignOff } from './caution';
import { CoefficientReuse } from './coefficient-reuse';
import { LimitSet, LimitUse } from './limit-set';
import { Machine, MachineEvent } from './machine';
import { Derived, MeasuredRecord, OneXVector, Reading, Waveform } from './measured-record';
import { Person, Session, SignInAttempt, SiteAccess } from './person';
import { Photo, WeightFixing } from './photo';
import { Plane, Position, Rotor, RotorStay } from './rotor';
import { Instrument, Setup } from './setup';
import { Area, Site } from './site';
import { ColumnLayout, Upload } from './upload';
import { Weight } from './weight';

/** Every entity, in the order a reader would meet them. */
export const entities = [
  Site,
  Area,
  Machine,
  MachineEvent,
  Rotor,
  RotorStay,
  Plane,
  Position,
  Bearing,
  Point,
  Setup,
  Instrument,
  LimitSet,
  LimitUse,
  ColumnLayout,
  Upload,
  MeasuredRecord,
  Waveform,
  Derived,
  Reading,
  OneXVector,
  BalanceJob,
  JobPlane,
  JobPoint,
  Run,
  RunVector,
  Weight,
  WeightFixing,
  Photo,
  Answer,
  Coefficient,
  CoefficientReuse,
  CautionShown,
  SignOff,
  Addendum,
  Person,
  SiteAccess,
  Session,
  SignInAttempt,
  AuditEvent,
];
