import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { announce } from '../../../src/components/ui/announcer.ts';
import { Caution } from '../../../src/components/ui/caution.tsx';
import { DataTable } from '../../../src/components/ui/data-table.tsx';
import { Dialog } from '../../../src/components/ui/dialog.tsx';
import { Disclosure } from '../../../src/components/ui/disclosure.tsx';
import { LiveRegion } from '../../../src/components/ui/live-region.tsx';
import { MeasureRow, MeasureTable } from '../../../src/components/ui/measure-table.tsx';
import { Notice } from '../../../src/components/ui/notice.tsx';
import { ProgressBar } from '../../../src/components/ui/progress-bar.tsx';
import { RelativeDay } from '../../../src/components/ui/relative-day.tsx';
import { Sheet } from '../../../src/components/ui/sheet.tsx';
import { Stamp } from '../../../src/components/ui/stamp.tsx';
import { TopStrip } from '../../../src/components/ui/top-strip.tsx';

describe('sheets and tables', () => {
  it('a sheet is a region with its title as name', () => {
    render(
      <Sheet title="Who has what" stamp={<Stamp tone="oxide">held</Stamp>}>
        text
      </Sheet>,
    );
    expect(within(screen.getByRole('region', { name: 'Who has what' })).getByText('held')).toBeVisible();
  });

  it('a measure is a row with its label as header and its entered value on hover', () => {
    render(
      <MeasureTable caption="To reach a hand-slip fit">
        <MeasureRow label="Take off the spigot, on diameter" value="0.118 mm" enteredAs="0.0046 in" emphasised />
      </MeasureTable>,
    );
    const table = screen.getByRole('table', { name: 'To reach a hand-slip fit' });
    const row = within(table).getByRole('row', { name: 'Take off the spigot, on diameter 0.118 mm' });
    expect(within(row).getByRole('cell')).toHaveAttribute('title', '0.0046 in');
  });

  it('a data table keeps its roles, names its rows and sorts by its headers', async () => {
    const onSort = vi.fn();
    render(
      <DataTable
        caption="Who has what"
        rows={[{ part: 'Hilt', holder: 'Aldgrove Turning' }]}
        rowKey={(row) => row.part}
        sort={{ key: 'part', direction: 'ascending' }}
        onSort={onSort}
        columns={[
          { key: 'part', header: 'Part', cell: (row) => row.part, namesRow: true, sortable: true },
          { key: 'holder', header: 'Holder', cell: (row) => row.holder },
        ]}
      />,
    );
    const table = screen.getByRole('table', { name: 'Who has what' });
    expect(within(table).getByRole('rowheader', { name: 'Hilt' })).toBeVisible();
    expect(within(table).getByRole('cell', { name: 'Aldgrove Turning' })).toBeVisible();
    expect(within(table).getByRole('columnheader', { name: 'Part' })).toHaveAttribute('aria-sort', 'ascending');
    await userEvent.click(within(table).getByRole('button', { name: 'Part' }));
    expect(onSort).toHaveBeenCalledWith({ key: 'part', direction: 'descending' });
  });

  it('an empty table says what will be here', () => {
    render(<DataTable caption="Parts" rows={[]} rowKey={String} columns={[]} empty={<p>Parts will be here</p>} />);
    expect(screen.getByText('Parts will be here')).toBeVisible();
    expect(screen.queryByRole('table')).toBeNull();
  });
});

describe('messages', () => {
  it('speaks the same words twice when they are said twice', () => {
    render(<LiveRegion />);
    act(() => announce('Draft kept'));
    const first = screen.getByText('Draft kept');
    act(() => announce('Draft kept'));
    expect(screen.getByText('Draft kept')).not.toBe(first);
    act(() => announce('The offer was not sent', 'assertive'));
    expect(screen.getByRole('alert')).toHaveTextContent('The offer was not sent');
  });

  it('a notice is an alert or a status, a caution says that it is one', () => {
    render(
      <>
        <Notice kind="alert" title="The offer was not sent">
          What you wrote is kept.
        </Notice>
        <Caution>Wear eye protection.</Caution>
      </>,
    );
    expect(screen.getByRole('alert')).toHaveTextContent('The offer was not sentWhat you wrote is kept.');
    expect(screen.getByText('Wear eye protection.')).toHaveTextContent('Caution: Wear eye protection.');
  });

  it('progress has its label and its value', () => {
    render(<ProgressBar label="Sending pommel.jpg" done={3} total={8} words="3 of 8 MB" />);
    expect(screen.getByRole('progressbar', { name: 'Sending pommel.jpg' })).toHaveAttribute('value', '3');
  });

  it('a day is absolute with its weekday, relative in brackets, with the year when it is another one', () => {
    const { rerender } = render(<RelativeDay day="2026-03-12" today="2026-03-10" />);
    expect(screen.getByText(/Thursday 12 March/)).toHaveTextContent('Thursday 12 March (in 2 days)');
    rerender(<RelativeDay day="2027-01-05" today="2026-12-28" form="short" />);
    expect(screen.getByText(/Tue 5 Jan/)).toHaveTextContent('Tue 5 Jan 2027 (in 8 days)');
  });
});

function Asking() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button onClick={() => setOpen(true)}>Offer another day</button>
      <Dialog open={open} onOpenChange={setOpen} title="Offer another day" description="They are told at once.">
        <input aria-label="Day" />
      </Dialog>
    </>
  );
}

describe('what opens', () => {
  it('a dialog takes the focus, says its title and description, leaves by Escape and gives the focus back', async () => {
    render(<Asking />);
    await userEvent.click(screen.getByRole('button', { name: 'Offer another day' }));
    const dialog = screen.getByRole('dialog', { name: 'Offer another day' });
    expect(dialog).toHaveAccessibleDescription('They are told at once.');
    expect(dialog).toContainElement(document.activeElement as HTMLElement);
    await userEvent.keyboard('{Escape}');
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(screen.getByRole('button', { name: 'Offer another day' })).toHaveFocus();
  });

  it('a dialog whose opener is gone gives the focus to the page', async () => {
    const { rerender } = render(
      <main tabIndex={-1}>
        <button key="answered">Answer</button>
      </main>,
    );
    const withDialog = (open: boolean, opener: boolean) => (
      <main tabIndex={-1}>
        {opener && <button key="answered">Answer</button>}
        <Dialog open={open} onOpenChange={vi.fn()} title="Answer" />
      </main>
    );
    screen.getByRole('button', { name: 'Answer' }).focus();
    rerender(withDialog(true, true));
    expect(screen.getByRole('dialog')).toContainElement(document.activeElement as HTMLElement);
    rerender(withDialog(false, false));
    await vi.waitFor(() => expect(screen.getByRole('main')).toHaveFocus());
  });

  it('a dialog writes no style sheet into the page, which the security policy would refuse', async () => {
    const sheetsBefore = document.querySelectorAll('style').length;
    render(<Asking />);
    await userEvent.click(screen.getByRole('button', { name: 'Offer another day' }));
    expect(screen.getByRole('dialog')).toBeVisible();
    expect(document.querySelectorAll('style').length).toBe(sheetsBefore);
  });

  it('a disclosure opens by keyboard and gives the focus back at Escape', async () => {
    render(
      <Disclosure label="Ines Aldgrove" buttonClassName="">
        <a href="#account">Account</a>
      </Disclosure>,
    );
    const opener = screen.getByRole('button', { name: 'Ines Aldgrove' });
    expect(screen.queryByRole('link', { name: 'Account' })).toBeNull();
    await userEvent.tab();
    await userEvent.keyboard('{Enter}');
    expect(opener).toHaveAttribute('aria-expanded', 'true');
    await userEvent.tab();
    expect(screen.getByRole('link', { name: 'Account' })).toHaveFocus();
    await userEvent.keyboard('{Escape}');
    expect(opener).toHaveFocus();
    expect(screen.queryByRole('link', { name: 'Account' })).toBeNull();
  });

  it('a disclosure closes at a press elsewhere, when the focus leaves it, and after a link of its own', async () => {
    render(
      <>
        <Disclosure label="Ines Aldgrove" buttonClassName="">
          <a href="#account">Account</a>
        </Disclosure>
        <button>Elsewhere</button>
      </>,
    );
    const opener = screen.getByRole('button', { name: 'Ines Aldgrove' });
    const leavings = [
      () => userEvent.click(screen.getByRole('button', { name: 'Elsewhere' })),
      () => userEvent.tab().then(() => userEvent.tab()),
      () => userEvent.click(screen.getByRole('link', { name: 'Account' })),
    ];
    for (const leave of leavings) {
      await userEvent.click(opener);
      expect(opener).toHaveAttribute('aria-expanded', 'true');
      await leave();
      expect(opener).toHaveAttribute('aria-expanded', 'false');
    }
  });

  it('the strip opens its places on a phone, and closes at Escape and after a link', async () => {
    render(<TopStrip homeLink={(mark) => <a href="#home">{mark}</a>} nav={<a href="#bench">My bench</a>} />);
    const opener = screen.getByRole('button', { name: 'Menu' });
    await userEvent.click(opener);
    expect(opener).toHaveAttribute('aria-expanded', 'true');
    await userEvent.keyboard('{Escape}');
    expect(opener).toHaveAttribute('aria-expanded', 'false');
    await userEvent.click(opener);
    await userEvent.click(screen.getByRole('link', { name: 'My bench' }));
    expect(opener).toHaveAttribute('aria-expanded', 'false');
    expect(screen.getByRole('link', { name: 'Ferrule' })).toBeVisible();
  });
});
