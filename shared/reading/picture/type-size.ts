import { eachComponent } from './components.ts';
import { type GreyPicture, inkOf } from './grey.ts';

/** As shares of an eleventh of the picture's height: what is lower or narrower is a dot, what is higher or wider no letter. */
const leastHeight = 0.03;
const mostHeight = 0.25;
const leastWidth = 0.02;
const mostWidth = 0.3;
/** A page of text has many; a drawing with some lettering, or a title page, says nothing of the body's type. */
const fewestLetters = 300;
/**
 * What the middle one of a page's letters is high, in inches: the type of books and typewriters, counted with its
 * capitals. Pages of known resolution came to 0.075 to 0.095; a small book's page taken for a sheet of 11 inches, to 0.1.
 */
const usualInches = 0.075;
const mostInches = 0.095;

/**
 * The resolution of a page that does not tell it, from the guess that it is a sheet of the usual height: type that would
 * be too large for a page of text tells that the sheet is smaller. The paper of `picture` has been made even.
 */
export function dpiByType(picture: GreyPicture, guess: number): number {
  const unit = picture.height / 11;
  const heights: number[] = [];
  eachComponent({ ...picture, ink: inkOf(picture) }, ({ width, height }) => {
    const isTall = height > unit * leastHeight && height < unit * mostHeight;
    if (isTall && width > unit * leastWidth && width < unit * mostWidth) heights.push(height);
  });
  if (heights.length < fewestLetters) return guess;
  const middle = heights.sort((a, b) => a - b)[Math.floor(heights.length / 2)] ?? 0;
  return middle / guess > mostInches ? Math.round(middle / usualInches) : guess;
}
