/**
 * Keeping what lies on disk from whoever finds the tablet: a random data key, wrapped under a passphrase, and what is
 * sealed with it. Everything is a published construction from the Java library; nothing here is our own cryptography.
 */
package bedmark.vault;
