import { IMAGE_SIZES, type ImageSize } from '../calc/vocabulary/images.js';

export const IMAGE_PREFIX = 'images/';

export const imageKey = (imageId: string, size: ImageSize) => `${IMAGE_PREFIX}${imageId}/${size}`;

export const imageKeys = (imageId: string) => IMAGE_SIZES.map((size) => imageKey(imageId, size));
