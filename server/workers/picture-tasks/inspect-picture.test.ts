import { describe, expect, it } from 'vitest';

import { jpeg, png, svg } from '#tests/support/pictures.ts';

import { inspectPicture } from './inspect-picture.ts';
import { sanitiseSvg } from './sanitise-svg.ts';

describe('telling a picture by its content', () => {
  it.each([
    ['a PNG', png(12, 9), 'image/png', 12, 9],
    ['a JPEG', jpeg(640, 480), 'image/jpeg', 640, 480],
    ['an SVG by its view box', svg('<rect width="3" height="3"/>'), 'image/svg+xml', 40, 30],
    [
      'an SVG by width and height',
      svg('<path d="M0 0"/>', 'width="120px" height="80"'),
      'image/svg+xml',
      120,
      80,
    ],
  ] as const)('reads the size of %s', (_name, bytes, mediaType, width, height) => {
    expect(inspectPicture(bytes)).toMatchObject({ usable: true, picture: { mediaType, width, height } });
  });

  it.each([
    ['HTML', '<!doctype html><script>alert(1)</script>'],
    [
      'HTML that holds an SVG',
      '<html><svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 1 1"><rect/></svg></html>',
    ],
    ['a PDF', '%PDF-1.7'],
    ['a GIF', 'GIF89a'],
    ['nothing', ''],
    [
      'an SVG with entities of its own',
      '<!DOCTYPE svg [<!ENTITY a "b">]><svg viewBox="0 0 1 1"><text>&a;</text></svg>',
    ],
  ])('takes %s for no picture', (_name, text) => {
    expect(inspectPicture(Buffer.from(text))).toMatchObject({ usable: false, code: 'unsupportedFile' });
  });

  it.each([
    ['a PNG cut short', png(5, 5).subarray(0, 40)],
    ['a PNG with a changed byte', Buffer.from(png(5, 5)).fill(7, 20, 21)],
    [
      'HTML behind the beginning of a PNG',
      Buffer.concat([png(5, 5).subarray(0, 8), Buffer.from('<html>IHDR IEND')]),
    ],
    ['a JPEG without frame', Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 4, 1, 1, 0xff, 0xd9])],
    ['a JPEG cut short', jpeg(5, 5).subarray(0, 18)],
  ])('refuses %s as damaged', (_name, bytes) => {
    const verdict = inspectPicture(bytes);
    expect(verdict).toMatchObject({ usable: false, code: 'unsupportedFile' });
    expect(JSON.stringify(verdict)).toMatch(/damaged/);
  });

  it('drops what hides behind the end of a picture', () => {
    for (const picture of [png(5, 5), jpeg(5, 5)]) {
      const verdict = inspectPicture(Buffer.concat([picture, Buffer.from('<script>alert(1)</script>')]));
      expect(verdict.usable && Buffer.from(verdict.picture.bytes).equals(picture)).toBe(true);
    }
  });

  it('refuses what is too large in bytes or in pixels', () => {
    expect(inspectPicture(Buffer.alloc(4 * 1024 * 1024 + 1, 0x89))).toMatchObject({ code: 'tooLarge' });
    expect(inspectPicture(svg(`<desc>${'x'.repeat(1024 * 1024)}</desc>`))).toMatchObject({
      code: 'tooLarge',
    });
    expect(inspectPicture(png(8_001, 1))).toMatchObject({ code: 'unsupportedFile' });
    expect(inspectPicture(svg('<rect/>', 'viewBox="0 0 9000 1"'))).toMatchObject({ code: 'unsupportedFile' });
  });

  it.each(['', 'viewBox="0 0 0 5"', 'width="50%" height="2cm"', 'viewBox="a b c d"'])(
    'refuses an SVG without a size: %s',
    (head) => {
      expect(inspectPicture(svg('<rect/>', head))).toMatchObject({ code: 'unsupportedFile' });
    },
  );
});

describe('cleaning an SVG', () => {
  const clean = (inside: string) => sanitiseSvg(svg(`<g>${inside}</g>`).toString()).svg;

  it.each([
    '<script>alert(1)</script>',
    '<SCRIPT href="https://evil.example/x.js"/>',
    '<style>@import url(https://evil.example/x.css);</style>',
    '<image href="https://evil.example/x.png"/>',
    '<image xlink:href="data:image/svg+xml;base64,PHN2Zz4="/>',
    '<a href="javascript:alert(1)"><text>press</text></a>',
    '<foreignObject><iframe src="https://evil.example"></iframe></foreignObject>',
    '<rect onload="alert(1)" onclick="alert(1)"/>',
    '<use href="https://evil.example/x.svg#a"/>',
    '<use xlink:href="data:image/svg+xml,x#a"/>',
    '<rect fill="url(https://evil.example/x.svg#a)"/>',
    '<rect style="fill:url(\'//evil.example/x\')"/>',
    '<rect style="background:u\\72l(https://evil.example/x)"/>',
    '<animate attributeName="href" to="javascript:alert(1)"/>',
    '<set attributeName="onclick" to="alert(1)"/>',
    '<filter><feImage href="https://evil.example/x"/></filter>',
    '<text><![CDATA[<script>alert(1)</script>]]></text>',
    '<svg><style><img src=x onerror=alert(1)></style></svg>',
    '<math><mtext><script>alert(1)</script></mtext></math>',
    '</g></svg><script>alert(1)</script><svg><g>',
    '<?xml-stylesheet href="https://evil.example/x.css"?>',
  ])('leaves nothing that runs or loads of %s', (inside) => {
    expect(clean(`<rect width="2"/>${inside}`)).not.toMatch(
      /<script|<style|<image|<a\b|foreignObject|iframe|evil|javascript:|\son\w+=|data:|<animate|<set|<use[^>]*href="[^#]|xml-stylesheet/i,
    );
  });

  it('keeps shapes, gradients, markers, texts with holes, and addresses within the picture', () => {
    const kept = clean(
      '<defs><marker id="m"><path d="M0 0"/></marker><linearGradient id="g"><stop offset="0" stop-color="#123"/></linearGradient></defs>' +
        '<path d="M0 0L5 5" marker-end="url(#m)" fill="url(#g)" style="stroke:#000;stroke-width:2"/>' +
        '<text x="1" text-anchor="middle">p.d. <tspan font-style="italic">V</tspan> = {{Va to kV, 2 sf}}</text>',
    );
    for (const piece of [
      'id="m"',
      'linearGradient',
      'stop-color="#123"',
      'marker-end="url(#m)"',
      'fill="url(#g)"',
      'stroke-width:2',
      '{{Va to kV, 2 sf}}',
      'viewBox="0 0 40 30"',
    ])
      expect(kept).toContain(piece);
  });

  it('gives a text that comes out of cleaning unchanged', () => {
    const once = clean('<rect width="2" height="1"/><text>a &lt; b &amp; c</text>');
    expect(sanitiseSvg(once).svg).toBe(once);
  });
});
