import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cleanFileName, downloadName } from '../../../server/integrations/storage/file-name.ts';

describe('cleanFileName', () => {
  it.each([
    ['bore after easing.jpg', 'bore after easing.jpg'],
    ['Länge – 長さ (2).png', 'Länge – 長さ (2).png'],
    ['../../../etc/passwd', 'passwd'],
    ['..\\..\\windows\\system32\\cmd.exe', 'cmd.exe'],
    ['/absolute/plan.pdf', 'plan.pdf'],
    ['..', 'file'],
    ['', 'file'],
    ['   ', 'file'],
    ['a/', 'file'],
    ['.hidden', 'hidden'],
    ['plan.pdf\0.exe', 'plan.pdf.exe'],
    ['a\r\nSet-Cookie: x.png', 'aSet-Cookie- x.png'],
    ['photo\u202Egnp.exe', 'photognp.exe'],
    ['in\u200Bvis\uFEFFible\u2066.txt', 'invisible.txt'],
    ['CON', '_CON'],
    ['nul.txt', '_nul.txt'],
    ['COM1.tar.gz', '_COM1.tar.gz'],
    ['console.txt', 'console.txt'],
    ['a<b>:"c|d?*.txt', 'a-b---c-d--.txt'],
    ['trailing. . .', 'trailing'],
    ['photo.png.html', 'photo.png.html'],
    ['e\u0301tui.png', '\u00E9tui.png'],
    ['half \uD83D picture.png', 'half  picture.png'],
    ['family \u{1F468}\u200D\u{1F469}.png', 'family \u{1F468}\u200D\u{1F469}.png'],
  ])('%j becomes %j', (received, cleaned) => {
    expect(cleanFileName(received)).toBe(cleaned);
  });

  it('shortens a name of 4 KB and keeps its ending', () => {
    const cleaned = cleanFileName(`${'長'.repeat(4096)}.jpeg`);
    expect([...cleaned]).toHaveLength(120);
    expect(cleaned.endsWith('長.jpeg')).toBe(true);
    expect([...cleanFileName('a'.repeat(4096))]).toHaveLength(120);
    expect([...cleanFileName(`a.${'b'.repeat(4096)}`)]).toHaveLength(120);
  });

  it('gives a name that needs no second cleaning, for any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 300 }), (received) => {
        const cleaned = cleanFileName(received);
        expect(cleaned).not.toMatch(/[/\\<>:"|?*\p{Cc}\u202A-\u202E\u2066-\u2069]/u);
        expect(cleaned).not.toMatch(/^[\s.]|[\s.]$/);
        expect([...cleaned].length).toBeGreaterThan(0);
        expect([...cleaned].length).toBeLessThanOrEqual(121);
        expect(cleanFileName(cleaned)).toBe(cleaned);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('downloadName', () => {
  it.each([
    ['bore.jpg', 'image/webp', 'bore.jpg.webp'],
    ['bore.webp', 'image/webp', 'bore.webp'],
    ['photo.png.html', 'image/webp', 'photo.png.html.webp'],
    ['plan.pdf.exe', 'application/pdf', 'plan.pdf.exe.pdf'],
    ['board.ini', 'text/plain', 'board.ini'],
    ['page.html', 'text/plain', 'page.html.txt'],
    ['run.BAT', 'text/plain', 'run.BAT.txt'],
    ['PLAN.PDF', 'application/pdf', 'PLAN.PDF'],
    ['file', 'application/zip', 'file.zip'],
    ['file', 'application/x-unknown', 'file.bin'],
  ])('%j of type %s is saved as %j', (name, mediaType, saved) => {
    expect(downloadName(name, mediaType)).toBe(saved);
  });
});
