export { ImageRoom as Component } from '@/features/images/room/image-room';
