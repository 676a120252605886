import { renameSync, writeFileSync, mkdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import QRCode from 'qrcode';
import sharp from 'sharp';
import { root } from '../../scripts/stack/places';

const WIDTH = 640;
const HEIGHT = 480;

/** The film that the browser takes for its camera; it is read anew each time a page opens the camera. */
export const CAMERA_FILM = join(root, '.tmp/camera.y4m');

/** Films a code held before the camera: a still picture, ten frames a second, as the browser's fake camera wants it. */
export async function filmCode(text: string): Promise<void> {
  const code = await QRCode.toBuffer(text, { errorCorrectionLevel: 'M', margin: 4, width: 400 });
  const luma = await sharp({ create: { width: WIDTH, height: HEIGHT, channels: 3, background: '#d8d8d8' } })
    .composite([{ input: code, gravity: 'centre' }])
    .toColourspace('b-w')
    .raw()
    .toBuffer();
  const frame = Buffer.concat([Buffer.from('FRAME\n'), luma, Buffer.alloc((WIDTH * HEIGHT) / 2, 128)]);
  mkdirSync(dirname(CAMERA_FILM), { recursive: true });
  writeFileSync(`${CAMERA_FILM}.new`, Buffer.concat([Buffer.from(`YUV4MPEG2 W${WIDTH} H${HEIGHT} F10:1 Ip C420jpeg\n`), frame, frame]));
  renameSync(`${CAMERA_FILM}.new`, CAMERA_FILM);
}
