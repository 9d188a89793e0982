/// Names of the style sheet, and how figures and pixels are shown.
package dev.leadline.desktop.style;
