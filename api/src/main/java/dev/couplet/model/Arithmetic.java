package dev.couplet.model;

import java.math.BigDecimal;

/**
 * The numbers that an expression is multiplied out in: doubles for objectives, where speed counts;
 * exact decimals for rules, where 0.1 + 0.2 must be 0.3.
 */
interface Arithmetic<N> {
  /** More than any number that can be kept; decimals grow no further. */
  int MOST_DIGITS = 1000;

  int FEW_DIGITS = 40;

  Arithmetic<Double> DOUBLES =
      new Arithmetic<>() {
        @Override
        public Double of(double value) {
          return value;
        }

        @Override
        public Double times(Double left, Double right) {
          return left * right;
        }

        @Override
        public Double plus(Double left, Double right) {
          return left + right;
        }
      };

  Arithmetic<BigDecimal> DECIMALS =
      new Arithmetic<>() {
        @Override
        public BigDecimal of(double value) {
          return Text.decimal(value);
        }

        @Override
        public BigDecimal times(BigDecimal left, BigDecimal right) {
          BigDecimal product = left.multiply(right);
          if (product.precision() <= FEW_DIGITS) {
            return product;
          }
          product = product.stripTrailingZeros();
          if (product.precision() > MOST_DIGITS) {
            throw new ArithmeticException("a number of more than " + MOST_DIGITS + " digits");
          }
          return product;
        }

        @Override
        public BigDecimal plus(BigDecimal left, BigDecimal right) {
          return left.add(right);
        }
      };

  N of(double value);

  N times(N left, N right);

  N plus(N left, N right);
}
