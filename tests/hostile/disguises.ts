import type { Base, HostileFile } from './wounds.ts';

const HTML = '<!doctype html><script>alert(document.domain)</script>';

/** The beginnings by which other programs know a file. */
const HEADS: Record<string, Buffer> = {
  html: Buffer.from(HTML),
  svg: Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" onload="alert(1)"/>'),
  pdf: Buffer.from('%PDF-1.7\n1 0 obj<</OpenAction<</S/JavaScript/JS(app.alert(1))>>>>endobj\n'),
  zip: Buffer.from('504b030414000000080000000000', 'hex'),
  gif: Buffer.from('474946383961010001000000003b', 'hex'),
  png: Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'),
  jpeg: Buffer.from('ffd8ffe000104a46494600010100', 'hex'),
  elf: Buffer.from('7f454c4602010100000000000000', 'hex'),
  shell: Buffer.from('#!/bin/sh\ntouch /tmp/owned\n'),
};

/** One file that is two: another kind before the clip, behind it, or in a box that players skip. */
const polyglots = (clip: Base): HostileFile[] =>
  Object.entries(HEADS).flatMap(([kind, head]) => {
    const skipped = Buffer.alloc(8 + head.length);
    skipped.writeUInt32BE(skipped.length, 0);
    skipped.write('free', 4, 'latin1');
    head.copy(skipped, 8);
    return [
      { name: `${kind}-before.mp4`, bytes: Buffer.concat([head, clip.bytes]) },
      { name: `${kind}-behind.mp4`, bytes: Buffer.concat([clip.bytes, head]) },
      { name: `${kind}-first-box.mp4`, bytes: Buffer.concat([skipped, clip.bytes]) },
      { name: `clip.${kind}`, bytes: clip.bytes },
    ];
  });

/** Names that mean something to a shell, a file system, a header or a page. */
const names = (clip: Base): HostileFile[] =>
  [
    '../../../../tmp/escaped.mp4',
    '..\\..\\escaped.mp4',
    '/etc/cron.d/escaped.mp4',
    'file:///etc/passwd.mp4',
    'http://127.0.0.1:9/a.mp4',
    'concat:a.mp4|b.mp4',
    '-i.mp4',
    '-vf=movie=a.mp4',
    '%03d.mp4',
    '$(touch owned).mp4',
    '`touch owned`.mp4',
    'a;b&c|d.mp4',
    'a\u0000.html.mp4',
    'a\r\nSet-Cookie: b=c.mp4',
    'a"; filename="b.html".mp4',
    '<img src=x onerror=alert(1)>.mp4',
    '\u202e4pm.exe.mp4',
    `${'long'.repeat(80)}.mp4`,
    '.mp4',
    'CON.mp4',
  ].map((name) => ({ name, bytes: clip.bytes }));

/** Texts that make a demuxer open something else. */
const pointers = (): HostileFile[] =>
  Object.entries({
    'list.m3u8': '#EXTM3U\n#EXTINF:5,\nfile:///etc/passwd\n#EXT-X-ENDLIST\n',
    'list.mp4': '#EXTM3U\n#EXTINF:5,\nhttp://127.0.0.1:9/a.ts\n#EXT-X-ENDLIST\n',
    'join.mp4': "ffconcat version 1.0\nfile '/etc/passwd'\n",
    'session.mp4': 'v=0\no=- 0 0 IN IP4 127.0.0.1\ns=-\nm=video 9 RTP/AVP 96\n',
    'dash.mp4':
      '<?xml version="1.0"?><MPD xmlns="urn:mpeg:dash:schema:mpd:2011"><BaseURL>file:///etc/</BaseURL></MPD>',
    'entities.mp4':
      '<!DOCTYPE a [<!ENTITY b "xxxxxxxx"><!ENTITY c "&b;&b;&b;&b;">]><a>&c;&c;&c;&c;</a>',
    'external.mp4': '<!DOCTYPE a [<!ENTITY b SYSTEM "file:///etc/passwd">]><a>&b;</a>',
    'subtitles.mp4': '1\n00:00:00,000 --> 00:00:05,000\n<b>words</b>\n',
    'script.mp4': HTML,
    'metadata.mp4': ';FFMETADATA1\ntitle=a\n[CHAPTER]\nTIMEBASE=1/0\nSTART=0\nEND=-1\n',
  }).map(([name, text]) => ({ name, bytes: Buffer.from(text) }));

/** Boxes in boxes, deeper than any clip has. */
const nested = (depth: number): HostileFile => {
  const bytes = Buffer.alloc(depth * 8);
  for (let n = 0; n < depth; n += 1) {
    bytes.writeUInt32BE(bytes.length - n * 8, n * 8);
    bytes.write('moov', n * 8 + 4, 'latin1');
  }
  return { name: `nested-${depth}.mp4`, bytes };
};

/** Files that pretend to be something else. */
export const disguisesOf = (clip: Base): HostileFile[] => [
  ...polyglots(clip),
  ...names(clip),
  ...pointers(),
  nested(60),
  nested(50_000),
];
