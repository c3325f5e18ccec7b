/** What a photo file says of itself: whether it is one, when it was taken, which way up it is held. */
package bedmark.photo;
