/** Width of the white edge between two dots that touch, millimetres. */
export const haloMm = 0.15;
