// Photos: what is a picture, its cleaned sizes in the store, and its row.
// Also uploads by form and by the outside edge: the store first, the transaction after.
// Not for what a picture shows or belongs to (donors, parts).
export { cleanPhoto } from './clean';
export { deletePhoto, restorePhoto } from './delete';
export { addPhotoRow, keepPhoto, savePhoto, type KeptPhoto } from './keep';
export { readPhoto } from './queries';
export { removedAmong } from './removed';
export { actionWithPhotos, changeWithPhoto } from './upload';
export { readText } from './read-text';
