import { Disclosure } from '@/components/ui/disclosure';
import { CONTROL_STYLE, Field } from '@/components/ui/field';

export interface LaterDay {
  /** `2027-03-01`; empty: at once */
  day: string;
  /** an IANA time zone */
  timeZone: string;
}

interface LaterPublicationProps {
  later: LaterDay;
  onLater: (later: LaterDay) => void;
}

/** The day on which an accepted deposit is published, where the laboratory asked for one. */
export function LaterPublication({ later, onLater }: LaterPublicationProps) {
  return (
    <Disclosure summary="Publish on a later day" className="mt-3">
      <p className="text-sm">
        Until its first midnight only the laboratory and the curators see an accepted deposit.
      </p>
      <Field className="mt-2" label="Day" hint="empty: at once">
        {(tie) => (
          <input
            {...tie}
            type="date"
            value={later.day}
            onChange={({ target }) => onLater({ ...later, day: target.value })}
            className={CONTROL_STYLE}
          />
        )}
      </Field>
      <Field className="mt-2" label="Time zone" hint="the depositors’, such as Europe/Oslo">
        {(tie) => (
          <input
            {...tie}
            value={later.timeZone}
            onChange={({ target }) => onLater({ ...later, timeZone: target.value.trim() })}
            className={CONTROL_STYLE}
          />
        )}
      </Field>
    </Disclosure>
  );
}
