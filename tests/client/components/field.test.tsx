import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { Button } from '../../../src/components/ui/button.tsx';
import { Checkbox } from '../../../src/components/ui/checkbox.tsx';
import { DateInput } from '../../../src/components/ui/date-input.tsx';
import { Field } from '../../../src/components/ui/field.tsx';
import { FilePicker } from '../../../src/components/ui/file-picker.tsx';
import { RadioGroup } from '../../../src/components/ui/radio-group.tsx';
import { Select } from '../../../src/components/ui/select.tsx';
import { TextArea } from '../../../src/components/ui/text-area.tsx';
import { TextInput } from '../../../src/components/ui/text-input.tsx';

describe('Field', () => {
  it('ties label, hint and error to the control', () => {
    render(
      <Field label="Day offered" hint="A working day." error="That day is over. Choose a later one." required>
        <TextInput />
      </Field>,
    );
    const control = screen.getByRole('textbox', { name: 'Day offered' });
    expect(control).toBeInvalid();
    expect(control).toBeRequired();
    expect(control).toHaveAccessibleDescription('A working day. That day is over. Choose a later one.');
  });

  it('is silent about errors while there are none', () => {
    render(
      <Field label="Note" optional>
        <TextArea />
      </Field>,
    );
    const control = screen.getByRole('textbox', { name: 'Note (optional)' });
    expect(control).toBeValid();
    expect(control).not.toHaveAttribute('aria-describedby');
  });

  it('keeps a description that the control brings along', () => {
    render(
      <>
        <p id="more">In your own unit.</p>
        <Field label="Gauge" hint="As it is written on it.">
          <Select aria-describedby="more">
            <option>Caliper</option>
          </Select>
        </Field>
      </>,
    );
    expect(screen.getByRole('combobox')).toHaveAccessibleDescription('In your own unit. As it is written on it.');
  });
});

describe('Button', () => {
  it('does not submit a form by accident', async () => {
    const onSubmit = vi.fn((event: SubmitEvent) => event.preventDefault());
    render(
      <form onSubmit={(event) => onSubmit(event.nativeEvent)}>
        <Button>Offer this date</Button>
        <Button type="submit">Send</Button>
      </form>,
    );
    await userEvent.click(screen.getByRole('button', { name: 'Offer this date' }));
    expect(onSubmit).not.toHaveBeenCalled();
    await userEvent.click(screen.getByRole('button', { name: 'Send' }));
    expect(onSubmit).toHaveBeenCalledTimes(1);
  });

  it('keeps the focus while busy and takes no second press, of itself or of its form', async () => {
    const onClick = vi.fn();
    const onSubmit = vi.fn();
    render(
      <form onSubmit={onSubmit}>
        <Button type="submit" busy busyLabel="Sending the offer" onClick={onClick}>
          Send the offer
        </Button>
      </form>,
    );
    const button = screen.getByRole('button', { name: 'Sending the offer' });
    await userEvent.tab();
    expect(button).toHaveFocus();
    await userEvent.keyboard('{Enter}');
    await userEvent.click(button);
    expect(onClick).not.toHaveBeenCalled();
    expect(onSubmit).not.toHaveBeenCalled();
    expect(button).toHaveAttribute('aria-busy', 'true');
  });
});

describe('RadioGroup', () => {
  it('is a named group whose arrow keys choose', async () => {
    const onValueChange = vi.fn();
    render(
      <RadioGroup
        legend="Does it show"
        name="show"
        defaultValue="no"
        onValueChange={onValueChange}
        error="Say whether it shows."
        options={[
          { value: 'no', label: 'It does not' },
          { value: 'yes', label: 'It does', hint: 'The client is asked.' },
        ]}
      />,
    );
    const group = screen.getByRole('group', { name: 'Does it show' });
    expect(group).toHaveAccessibleDescription('Say whether it shows.');
    await userEvent.tab();
    await userEvent.keyboard('{ArrowDown}');
    expect(screen.getByRole('radio', { name: 'It does' })).toBeChecked();
    expect(screen.getByRole('radio', { name: 'It does' })).toHaveAccessibleDescription('The client is asked.');
    expect(onValueChange).toHaveBeenCalledWith('yes');
  });
});

describe('Checkbox, DateInput, FilePicker', () => {
  it('a checkbox has its hint as description and is pressed by its words', async () => {
    render(<Checkbox label="The cell stays out" hint="Ask the carrier." />);
    const box = screen.getByRole('checkbox', { name: 'The cell stays out' });
    expect(box).toHaveAccessibleDescription('Ask the carrier.');
    await userEvent.click(screen.getByText('The cell stays out'));
    expect(box).toBeChecked();
  });

  it('a date says its weekday, also after a change', async () => {
    render(
      <Field label="Day offered">
        <DateInput defaultValue="2026-03-12" />
      </Field>,
    );
    const field = screen.getByLabelText('Day offered');
    expect(screen.getByRole('status')).toHaveTextContent('Thursday');
    await userEvent.clear(field);
    expect(screen.getByRole('status')).toBeEmptyDOMElement();
    await userEvent.type(field, '2026-03-13');
    expect(screen.getByRole('status')).toHaveTextContent('Friday');
  });

  it('a file is picked by the words on the button, and the same one can be picked again', async () => {
    const onFiles = vi.fn();
    render(
      <FilePicker onFiles={onFiles} accept="image/*" capture="environment">
        Add photographs
      </FilePicker>,
    );
    const input = screen.getByLabelText('Add photographs');
    expect(input).toHaveAttribute('capture', 'environment');
    const file = new File(['x'], 'pommel.jpg', { type: 'image/jpeg' });
    await userEvent.upload(input, file);
    await userEvent.upload(input, file);
    expect(onFiles.mock.calls).toEqual([[[file]], [[file]]]);
  });
});
