import { createServer, type Server } from 'node:http';
import { type AddressInfo } from 'node:net';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { readWebVtt } from '../../api/features/recordings/transcript-file/web-vtt.ts';
import { openBrowser } from '../support/browser.ts';

/** Nasty files, each with what makes it so. The measure is what the browser's own track makes of them. */
const FILES: Readonly<Record<string, string>> = {
  plain: 'WEBVTT\n\n00:01.000 --> 00:02.000\nhello\n',
  'text after the signature': 'WEBVTT - words\n\n00:01.000 --> 00:02.000\nhello\n',
  'a signature that runs on': 'WEBVTTX\n\n00:01.000 --> 00:02.000\nhello\n',
  'no signature': '00:01.000 --> 00:02.000\nhello\n',
  'a byte-order mark': '\uFEFFWEBVTT\n\n00:01.000 --> 00:02.000\nhello\n',
  'CRLF lines': 'WEBVTT\r\n\r\n00:01.000 --> 00:02.000\r\nhello\r\nthere\r\n',
  'CR lines': 'WEBVTT\r\r00:01.000 --> 00:02.000\rhello\r',
  'no last newline': 'WEBVTT\n\n00:01.000 --> 00:02.000\nhello',
  'a header of several lines': 'WEBVTT\nKind: captions\nLanguage: en\n\n00:01.000 --> 00:02.000\nhello\n',
  'a cue straight after the signature': 'WEBVTT\n00:01.000 --> 00:02.000\nhello\n',
  'cues without blank lines between': 'WEBVTT\n\n00:01.000 --> 00:02.000\none\n00:03.000 --> 00:04.000\ntwo\n',
  'names of cues': 'WEBVTT\n\nfirst cue\n00:01.000 --> 00:02.000\none\n\n2\n00:03.000 --> 00:04.000\ntwo\n',
  'two lines of name': 'WEBVTT\n\nfirst\nsecond\n00:01.000 --> 00:02.000\none\n',
  'a comma for the stop': 'WEBVTT\n\n00:01,000 --> 00:02,000\nhello\n\n00:03.000 --> 00:04.000\ntwo\n',
  'two digits of fraction': 'WEBVTT\n\n00:01.00 --> 00:02.000\nhello\n\n00:03.000 --> 00:04.000\ntwo\n',
  'four digits of fraction': 'WEBVTT\n\n00:01.0000 --> 00:02.000\nhello\n',
  'sixty seconds': 'WEBVTT\n\n00:60.000 --> 01:02.000\nhello\n\n00:03.000 --> 00:04.000\ntwo\n',
  'sixty minutes': 'WEBVTT\n\n00:60:01.000 --> 00:61:02.000\nhello\n',
  'long hours': 'WEBVTT\n\n100:00:01.000 --> 100:00:02.000\nhello\n',
  'one digit of hours': 'WEBVTT\n\n1:00:01.000 --> 1:00:02.000\nhello\n',
  'one digit of minutes': 'WEBVTT\n\n0:01.000 --> 0:02.000\nhello\n',
  'no spaces at the arrow': 'WEBVTT\n\n00:01.000-->00:02.000\nhello\n',
  'tabs at the arrow': 'WEBVTT\n\n00:01.000\t-->\t00:02.000\nhello\n',
  'a broken arrow': 'WEBVTT\n\n00:01.000 -> 00:02.000\nhello\n\n00:03.000 --> 00:04.000\ntwo\n',
  'space before the time': 'WEBVTT\n\n  00:01.000 --> 00:02.000\nhello\n',
  'settings and nonsense after the time': 'WEBVTT\n\n00:01.000 --> 00:02.000 align:start position:10% foo bar\nhello\n',
  'notes, styles and regions':
    'WEBVTT\n\nNOTE words\nmore\n\nSTYLE\n::cue { color: red }\n\nREGION\nid:fred\n\n00:01.000 --> 00:02.000\nhello\n',
  'an end before its beginning': 'WEBVTT\n\n00:05.000 --> 00:02.000\nhello\n\n00:06.000 --> 00:07.000\ntwo\n',
  'an empty cue': 'WEBVTT\n\n00:01.000 --> 00:02.000\n\n00:03.000 --> 00:04.000\ntwo\n',
  nulls: 'WEBVTT\n\n00:01.000 --> 00:02.000\nhel\0lo\n',
  'many blank lines': 'WEBVTT\n\n\n\n\n00:01.000 --> 00:02.000\nhello\n\n\n\n00:03.000 --> 00:04.000\ntwo\n\n\n',
  'an arrow inside the words': 'WEBVTT\n\n00:01.000 --> 00:02.000\nthis --> that\nmore\n',
  'only a signature': 'WEBVTT',
  nothing: '',
};

interface BrowserCue {
  readonly id: string;
  readonly start: number;
  readonly end: number;
  readonly text: string;
}

let server: Server;
let browser: Browser;
let page: Page;
let origin: string;

beforeAll(async () => {
  const names = Object.keys(FILES);
  server = createServer((req, res) => {
    const index = /^\/(\d+)\.vtt$/.exec(req.url ?? '')?.[1];
    res.setHeader('content-type', index === undefined ? 'text/html' : 'text/vtt');
    res.end(index === undefined ? '<!doctype html><title>t</title><video></video>' : FILES[names[Number(index)]!]);
  });
  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  origin = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  browser = await openBrowser();
  page = await browser.newPage();
  await page.goto(origin);
});

afterAll(async () => {
  await browser.close();
  await new Promise((done) => server.close(done));
});

/** What the browser's own track holds of a file. */
async function ofBrowser(index: number): Promise<readonly BrowserCue[]> {
  return page.evaluate(async (src) => {
    const track = document.createElement('track');
    track.src = src;
    track.default = true;
    const loaded = new Promise((done) => {
      track.addEventListener('load', done);
      track.addEventListener('error', done);
    });
    document.querySelector('video')!.append(track);
    track.track.mode = 'hidden';
    await loaded;
    const cues = [...(track.track.cues ?? [])] as VTTCue[];
    const read = cues.map((cue) => ({
      id: cue.id,
      start: Math.round(cue.startTime * 1000),
      end: Math.round(cue.endTime * 1000),
      text: cue.text,
    }));
    track.remove();
    return read;
  }, `/${index}.vtt`);
}

describe('of a nasty WebVTT file the reader takes what the browser takes', () => {
  test.each(Object.keys(FILES).map((name, index) => [name, index] as const))('with %s', async (name, index) => {
    const text = FILES[name]!.replace(/^\uFEFF/, '');
    const ours = readWebVtt(text)
      .cues.map((cue) => ({ id: cue.id, start: cue.startMs, end: cue.endMs, text: cue.text }))
      .sort((a, b) => a.start - b.start);
    expect(ours).toEqual(await ofBrowser(index));
  });
});
