import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useRef } from 'react';
import type { FormEvent } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { Field } from '../../../src/components/ui/field.tsx';
import { LengthInput } from '../../../src/components/ui/length-input.tsx';
import { LiveRegion } from '../../../src/components/ui/live-region.tsx';

const onSubmit = vi.fn();

function Readings({ onLastEnter, onValueEnd }: { onLastEnter?: () => void; onValueEnd?: (typed: string) => void }) {
  const form = useRef<HTMLFormElement>(null);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    onSubmit();
  };
  return (
    <form ref={form} onSubmit={submit}>
      <LiveRegion />
      <Field label="Bore, first">
        <LengthInput unit="mm" onValueEnd={onValueEnd} />
      </Field>
      <Field label="Temperature">
        <input />
      </Field>
      <Field label="Bore, second">
        <LengthInput unit="mm" disabled />
      </Field>
      <Field label="Bore, third">
        <LengthInput unit="mm" defaultValue="31.9" onLastEnter={onLastEnter} />
      </Field>
      <button type="submit">Keep the readings</button>
    </form>
  );
}

describe('LengthInput, as a caliper that types like a keyboard uses it', () => {
  it('goes to the next length field at Enter, over other controls and what is disabled, and never submits', async () => {
    onSubmit.mockClear();
    const user = userEvent.setup({ delay: null });
    render(<Readings />);
    await user.click(screen.getByLabelText('Bore, first'));
    await user.keyboard('31.957{Enter}31,960{Enter}');
    expect(screen.getByLabelText('Bore, first')).toHaveValue('31.957');
    // The old value was selected, so that the new one took its place; the comma is kept as typed.
    expect(screen.getByLabelText('Bore, third')).toHaveValue('31,960');
    expect(onSubmit).not.toHaveBeenCalled();
  });

  it('stays in the last field, so that a further Enter presses no button', async () => {
    onSubmit.mockClear();
    const onLastEnter = vi.fn();
    const user = userEvent.setup({ delay: null });
    render(<Readings onLastEnter={onLastEnter} />);
    await user.click(screen.getByLabelText('Bore, third'));
    await user.keyboard('{Enter}{Enter}');
    expect(screen.getByLabelText('Bore, third')).toHaveFocus();
    expect(onLastEnter).toHaveBeenCalledTimes(2);
    expect(onSubmit).not.toHaveBeenCalled();
  });

  it('hands over what was typed and announces it', async () => {
    const onValueEnd = vi.fn();
    const user = userEvent.setup({ delay: null });
    render(<Readings onValueEnd={onValueEnd} />);
    await user.click(screen.getByLabelText('Bore, first'));
    await user.keyboard('1 17/64 in{Enter}');
    expect(onValueEnd).toHaveBeenCalledWith('1 17/64 in');
    expect(screen.getByRole('status')).toHaveTextContent('1 17/64 in entered');
  });

  it('keeps to its own group where a page has two', async () => {
    const user = userEvent.setup({ delay: null });
    render(
      <>
        <div data-length-group="">
          <LengthInput aria-label="a1" />
          <LengthInput aria-label="a2" />
        </div>
        <div data-length-group="">
          <LengthInput aria-label="b1" />
        </div>
      </>,
    );
    await user.click(screen.getByLabelText('a1'));
    await user.keyboard('1{Enter}2{Enter}');
    expect(screen.getByLabelText('a2')).toHaveFocus();
    expect(screen.getByLabelText('b1')).toHaveValue('');
  });
});
