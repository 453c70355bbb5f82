import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { BandInput } from '../../../shared/engines/band/band-types.ts';
import { JointSection } from '../../../src/components/drawings/joint-section.tsx';
import { bandModel } from '../../../shared/engines/band/band-model.ts';
import { RelayBandDown } from '../../../src/components/drawings/relay-band-down.tsx';
import { RelayBand } from '../../../src/components/drawings/relay-band.tsx';
import { ZoneDrawing } from '../../../src/components/drawings/zone-drawing.tsx';

const hole = { name: 'bore', agreed: { label: 'H8', lowerUm: 0, upperUm: 39 }, readingsUm: [31, 9] };
const shaft = { name: 'spigot', agreed: null, readingsUm: [22, 52] };

const band: BandInput = {
  todayIso: '2026-03-10',
  deliveredOn: null,
  expected: { fromDay: '2026-04-13', toDay: '2026-04-20' },
  parts: [{ id: 'hilt', name: 'Hilt' }],
  legs: [
    {
      id: 'turn',
      partId: 'hilt',
      shopName: 'Aldgrove Turning',
      work: 'machining',
      state: 'finished',
      startDay: '2026-02-04',
      endDay: '2026-02-18',
      held: null,
      afterLegIds: [],
    },
    {
      id: 'wire',
      partId: 'hilt',
      shopName: 'Tinder Lane',
      work: 'wiring',
      state: 'under-way',
      startDay: '2026-03-06',
      endDay: '2026-03-30',
      held: { sinceDay: '2026-03-09', words: 'pommel will not draw' },
      afterLegIds: ['turn'],
    },
  ],
  handoffs: [
    {
      id: 'over',
      partIds: ['hilt'],
      fromName: 'Aldgrove Turning',
      toName: 'Tinder Lane',
      fromLegId: 'turn',
      toLegId: 'wire',
      day: '2026-02-20',
      state: 'done',
    },
  ],
};

describe('RelayBand', () => {
  it('hides the drawing from readers and gives them its steps in the same order', () => {
    render(<RelayBand label="The way of The Salt Lantern" input={band} />);
    const figure = screen.getByRole('figure', { name: 'The way of The Salt Lantern' });
    expect(figure.querySelector('svg')).toHaveAttribute('aria-hidden', 'true');
    expect(
      within(figure)
        .getAllByRole('listitem')
        .map((item) => item.textContent),
    ).toEqual([
      'Hilt: machining, Aldgrove Turning, done Wed 18 Feb',
      'Hilt: Aldgrove Turning to Tinder Lane, handed over Fri 20 Feb',
      'Hilt: wiring, Tinder Lane, held since Mon 9 Mar: pommel will not draw (here now)',
      'Delivery, likely 13–20 April',
    ]);
  });

  it('draws tube, ring, saw cut, bead, fade and the day of today', () => {
    const { container } = render(<RelayBand label="The way" input={band} />);
    const words = [...container.querySelectorAll('svg text')].map((text) => text.textContent);
    expect(words.some((text) => text?.includes('Held: pommel will not draw'))).toBe(true);
    expect(words).toContain('Tue 10 Mar');
    expect(words.some((text) => text?.includes('likely 13–20 April'))).toBe(true);
    expect(container.querySelectorAll('path.stroke-oxide')).toHaveLength(2);
    expect(container.querySelectorAll('circle.fill-soot')).toHaveLength(1);
    expect(container.querySelectorAll('ellipse.fill-brass')).toHaveLength(1);
  });

  it('is itself the list when it runs downwards, and says nothing twice', () => {
    render(<RelayBandDown model={bandModel(band, 40)} />);
    expect(screen.getAllByRole('list')).toHaveLength(1);
    const items = screen.getAllByRole('listitem');
    expect(items.map((item) => item.textContent)).toEqual([
      'machiningAldgrove Turning, done Wed 18 Feb',
      'Aldgrove Turning to Tinder Lanehanded over Fri 20 Feb',
      'wiring (here now)Tinder Lane, held since Mon 9 Mar: pommel will not draw',
      'Deliverylikely 13–20 April',
    ]);
  });

  it('names the part of each step when there are several', () => {
    const parts = [...band.parts, { id: 'blade', name: 'Blade' }];
    const blade = { ...band.legs[0]!, id: 'blade', partId: 'blade', work: 'blade', startDay: '2026-03-01' };
    render(<RelayBandDown model={bandModel({ ...band, parts, legs: [...band.legs, blade] }, 40)} />);
    expect(screen.getAllByText('Hilt')).toHaveLength(3);
    expect(screen.getAllByText('Blade')).toHaveLength(1);
  });
});

describe('drawings of a joint', () => {
  it('the zone drawing is an image with name and words, and says its scale', () => {
    render(<ZoneDrawing title="pommel spigot in hilt bore" nominalMm={32} hole={hole} shaft={shaft} />);
    const image = screen.getByRole('img', { name: /^Tolerance zones: pommel spigot in hilt bore/ });
    expect(image).toHaveAccessibleName(/Spigot: nothing agreed.*Worst pair: 43 µm interference\.$/);
    expect(screen.getByText(/Up and down \d+:1 on paper/)).toBeVisible();
    expect(image.querySelectorAll('circle')).toHaveLength(2);
    expect(screen.getByText('worst pair: 43 µm interference')).toHaveClass('fill-oxide');
  });

  it('colour is joined by hatch: zones and worst pair are filled with lines', () => {
    const { container } = render(
      <ZoneDrawing title="joint" nominalMm={32} hole={hole} shaft={{ ...shaft, agreed: hole.agreed }} />,
    );
    const hatches = [...container.querySelectorAll('pattern')].map((pattern) => `url(#${pattern.id})`);
    const filled = [...container.querySelectorAll('rect[fill]')].map((rect) => rect.getAttribute('fill'));
    expect(filled).toHaveLength(3);
    expect(new Set(filled)).toEqual(new Set(hatches));
  });

  it('the section tells sizes, what binds and what comes off', () => {
    render(
      <JointSection
        title="pommel spigot in hilt bore"
        holeName="bore"
        shaftName="spigot"
        holeDiameterMm={32.009}
        shaftDiameterMm={32.052}
        engagementMm={16}
        wallMm={null}
        removal={{ from: 'shaft', onDiameterMm: 0.118, overLengthMm: 14.5 }}
      />,
    );
    expect(screen.getByRole('img')).toHaveAccessibleName(
      'Section: pommel spigot in hilt bore The spigot, 32.052 mm across, in the bore, 32.009 mm across, over 16.000 mm. ' +
        'They bind by 43 µm. 0.118 mm comes off the spigot, on diameter, over 14.500 mm.',
    );
    expect(screen.getByText(/clearance and removal drawn \d+ times larger/)).toBeVisible();
    expect(screen.getByText(/The outer wall is not measured/)).toBeVisible();
  });
});
