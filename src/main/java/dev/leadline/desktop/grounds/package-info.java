/// The right of the window: the reasons for and against signing.
package dev.leadline.desktop.grounds;
