import { readdirSync, statSync } from 'node:fs'
import { readFile, writeFile } from 'node:fs/promises'
import path from 'node:path'
import { promisify } from 'node:util'
import { brotliCompress, constants, gzip } from 'node:zlib'

const COMPRESSIBLE = /\.(?:html|js|mjs|css|json|wasm|svg|ttf|otf|webmanifest|txt)$/
const MIN_BYTES = 1_024

/**
 * Lays a `.br` and a `.gz` beside each file that gets smaller by it.
 *
 * @param {string} folder
 */
export async function precompress(folder) {
  const files = readdirSync(folder, { recursive: true })
    .map((name) => path.join(folder, name))
    .filter((file) => COMPRESSIBLE.test(file) && statSync(file).isFile() && statSync(file).size >= MIN_BYTES)
  await Promise.all(files.map(compressFile))
}

async function compressFile(file) {
  const bytes = await readFile(file)
  const [brotli, gzipped] = await Promise.all([
    promisify(brotliCompress)(bytes, {
      params: {
        [constants.BROTLI_PARAM_QUALITY]: constants.BROTLI_MAX_QUALITY,
        [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length,
      },
    }),
    promisify(gzip)(bytes, { level: 9 }),
  ])
  if (brotli.length < bytes.length) await writeFile(`${file}.br`, brotli)
  if (gzipped.length < bytes.length) await writeFile(`${file}.gz`, gzipped)
}
