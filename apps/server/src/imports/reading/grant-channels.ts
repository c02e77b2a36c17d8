import { nameOf } from './addresses.ts';
import { refusedClaims, type Refusal } from './channel-claims.ts';
import { addressOf, type DesignIndex } from './design-index.ts';
import { setSignal, SIGNAL_KEYS, SUBJECTS, type RowReading } from './row-reading.ts';

const PURPOSES = ['control', 'status'] as const;

/**
 * Gives the rows the channels that they ask for, and reports those that somebody else has.
 *
 * @param readings the rows that are imported, in the order of the file
 */
export function grantChannels(readings: readonly RowReading[], index: DesignIndex): void {
  for (const refusal of refusedClaims(readings, index)) reportTaken(refusal);
  for (const reading of readings) {
    if (reading.point) keepControllerTogether(reading, index);
    for (const purpose of PURPOSES) {
      const granted = reading.wants[purpose];
      if (granted) setSignal(reading.values, purpose, granted.module.name, granted.channel, addressOf(granted.module, granted.channel));
    }
  }
}

function reportTaken({ reading, purpose, holder }: Refusal): void {
  const wanted = reading.wants[purpose]!;
  const keys = SIGNAL_KEYS[purpose];
  const address = addressOf(wanted.module, wanted.channel);
  reading.dropSignal(purpose);
  reading.warn(
    SUBJECTS[purpose],
    {
      code: purpose === 'control' ? 'output-taken' : 'input-taken',
      message: `${reading.controller!.name} ${address} (${nameOf(wanted)}) is taken by ${holder}.`,
      remedy: 'Choose another channel, or assign one after the import.',
    },
    reading.filled(keys.address) ? keys.address : keys.channel,
  );
}

/** A point cannot change its controller while a channel of the old one stays assigned to it. */
function keepControllerTogether(reading: RowReading, index: DesignIndex): void {
  const { controller } = reading;
  // a file that says what the project says moves nothing
  if (controller === null || controller.name === reading.existing.controller) return;
  const dispenser = reading.point ? index.dispenserByPoint.get(reading.point.id) : undefined;
  const left = PURPOSES.some((purpose) => {
    const assigned = index.assignmentOf(dispenser, purpose);
    const stays = assigned && !reading.wants[purpose];
    return stays && index.moduleById.get(assigned.moduleId)?.controllerId !== controller.id;
  });
  if (!left) return;
  reading.dropSignal('control');
  reading.dropSignal('status');
  reading.values.controller = null;
  reading.warn('controller', {
    code: 'controller-contradiction',
    message: `The point has a channel of ${reading.existing.controller ?? 'another controller'} that the list does not replace. Its channels stay as they are.`,
    remedy: 'Give output and status of the new controller in the list, or take the channels off the point first.',
  });
}
