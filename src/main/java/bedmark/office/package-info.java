/**
 * The office: packs from many tablets taken in whole, merged, ranked worst first, followed over time. The journal in
 * its folder, or the server that several desks share, is the truth; everything else can be made anew.
 */
package bedmark.office;
