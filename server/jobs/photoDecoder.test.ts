import { describe, expect, it } from 'vitest'
import { buildPicture } from '@/tests/support/buildPicture'
import { createPhotoDecoder } from './photoDecoder'

describe('looking at photos in a thread of its own', () => {
  it('encodes several afresh, one after the other', async () => {
    const decoder = createPhotoDecoder()
    const pictures = [await buildPicture(), Buffer.from('no picture'), await buildPicture({ widthPx: 500 })]

    const results = await Promise.all(pictures.map((bytes) => decoder.decode(bytes)))

    expect(results).toMatchObject([
      { photo: { widthPx: 64, heightPx: 48 } },
      { fault: 'not-decodable' },
      { photo: { widthPx: 500 } },
    ])
  })

  it('M7 gives up on one that takes too long or too much, and looks at the next', async () => {
    const picture = await buildPicture()
    const hasty = createPhotoDecoder({ timeoutMs: 1 })
    const narrow = createPhotoDecoder({ memoryMb: 4 })

    expect(await hasty.decode(picture)).toEqual({ fault: 'took-too-long' })
    expect(await hasty.decode(picture)).toEqual({ fault: 'took-too-long' })
    expect(await narrow.decode(picture)).toEqual({ fault: 'took-too-much-memory' })
    expect(await createPhotoDecoder().decode(picture)).toHaveProperty('photo')
  })
})
