/// From the text of a formula to kernels over blocks of draws.
package dev.leadline.formula;
