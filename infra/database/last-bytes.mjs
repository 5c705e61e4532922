import { Transform } from 'node:stream';

/** Passes everything on and keeps the last bytes, where the dump says that it is complete. */
export class LastBytes extends Transform {
  #text = '';

  get isCompleteDump() {
    return this.#text.includes('-- Dump completed');
  }

  _transform(chunk, _encoding, done) {
    this.#text = (this.#text + chunk.toString('latin1')).slice(-200);
    done(null, chunk);
  }
}
