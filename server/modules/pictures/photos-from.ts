import { AppError } from '#server/http/app-error.ts';
import type { PressPhoto } from '#server/artwork/paint-label.ts';
import type { ObjectStore } from '#server/storage/object-store.ts';
import type { HousePicture } from './picture.entity.ts';

/** Fetches the plates of photos from the store. @throws AppError `unavailable` where the store has lost one */
export function photosFrom(storage: Pick<ObjectStore, 'getObject'>) {
  return async (pictures: readonly HousePicture[]): Promise<ReadonlyMap<string, PressPhoto>> => {
    const photos = new Map<string, PressPhoto>();
    for (const { id, kind, name, width, height, platesKey } of pictures) {
      if (kind !== 'photo') continue;
      const stored = await storage.getObject(platesKey);
      if (!stored) throw new AppError('unavailable', { message: `The picture ${name} is missing in the storage for files. Send it again.` });
      photos.set(id, { width, height, plates: stored.bytes });
    }
    return photos;
  };
}
