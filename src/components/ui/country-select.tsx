import type { ComponentProps } from 'react';
import { countries } from '../../../shared/units/countries.ts';
import { Select } from './select.tsx';

/** A country by its name; its value is the two-letter code. */
export function CountrySelect(props: Omit<ComponentProps<typeof Select>, 'children'>) {
  return (
    <Select {...props}>
      <option value="" disabled>
        Choose
      </option>
      {countries().map(({ code, name }) => (
        <option key={code} value={code}>
          {name}
        </option>
      ))}
    </Select>
  );
}
